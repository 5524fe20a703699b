import { h, type FunctionalComponent, type VNode } from 'vue'
import type { ProseNode } from '../../../shared/markdown.js'

function toVNode(node: ProseNode): VNode | string {
  if (typeof node === 'string') return node
  return h(node.tag, node.attributes, node.children.map(toVNode))
}

/** Prose as elements of our own: nothing of it ever passes through HTML. */
export const ProseNodes: FunctionalComponent<{ nodes: readonly ProseNode[] }> = ({ nodes }) =>
  nodes.map(toVNode)
ProseNodes.props = ['nodes']
