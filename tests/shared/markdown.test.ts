import { describe, expect, test } from 'vitest'
import { parseProse, type ProseElement, type ProseNode } from '../../shared/markdown.js'

const known = '0b6f6c1e-9c53-4a3e-8f53-1f1a4d1f0a01'
const parse = (markdown: string) =>
  parseProse(markdown, (id) =>
    id === known ? { label: '4', address: '#source-4', title: 'Huey 1977' } : null,
  )

function textOf(nodes: readonly ProseNode[]): string {
  return nodes.map((node) => (typeof node === 'string' ? node : textOf(node.children))).join('')
}

function findAll(nodes: readonly ProseNode[], tag: string): ProseElement[] {
  return nodes.flatMap((node) =>
    typeof node === 'string' ? [] : [...(node.tag === tag ? [node] : []), ...findAll(node.children, tag)],
  )
}

describe('prose', () => {
  test('raw HTML stays text', () => {
    const tree = parse('Hello <script>alert(1)</script> <img src=x onerror=alert(1)>')
    expect(textOf(tree)).toContain('<script>alert(1)</script>')
    expect(findAll(tree, 'p')).toHaveLength(1)
  })

  test('links out gain nothing from us', () => {
    const [link] = findAll(parse('[a](https://example.org)'), 'a')
    expect(link?.attributes).toEqual({ href: 'https://example.org', rel: 'nofollow ugc noopener' })
  })

  test.each([
    'javascript:alert(1)',
    'data:text/html,x',
    'vbscript:x',
    '//example.org/x',
    'JaVaScRiPt:alert(1)',
  ])('a link to %s is no link', (address) => {
    expect(findAll(parse(`[a](${address})`), 'a')).toHaveLength(0)
  })

  test('a picture is not fetched from the text', () => {
    const tree = parse('![x](https://example.org/x.png)')
    expect(findAll(tree, 'a')).toHaveLength(1)
    expect(JSON.stringify(tree)).not.toContain('"img"')
  })

  test('a citation becomes the number of its source, with its locator', () => {
    const [citation] = findAll(parse(`Warm [@${known}, p. 3].`), 'a')
    expect(citation?.attributes.href).toBe('#source-4')
    expect(textOf(citation?.children ?? [])).toBe('[4, p. 3]')
  })

  test('a citation of a source the page does not have says so', () => {
    const tree = parse('[@5d1b7a52-0000-4000-8000-000000000000]')
    expect(textOf(tree)).toBe('[source not on this page]')
    expect(findAll(tree, 'a')).toHaveLength(0)
  })

  test('headings start right below the heading of the section and keep their order', () => {
    const tree = parse('## One\n\n#### Two\n\ntext')
    expect(findAll(tree, 'h3').map((heading) => textOf(heading.children))).toEqual(['One'])
    expect(findAll(tree, 'h4').map((heading) => textOf(heading.children))).toEqual(['Two'])
  })

  test('lists, tables, emphasis and code keep their shape', () => {
    const tree = parse('- a\n- *b*\n\n1. one\n\n| x | y |\n|---|--:|\n| 1 | `2` |\n')
    expect(findAll(tree, 'ul')[0]?.children.filter((node) => typeof node !== 'string')).toHaveLength(2)
    expect(textOf(findAll(tree, 'em'))).toBe('b')
    expect(findAll(tree, 'ol')).toHaveLength(1)
    expect(findAll(tree, 'td').map((cell) => textOf([cell]))).toEqual(['1', '2'])
    expect(findAll(tree, 'td')[1]?.attributes).toEqual({ 'data-align': 'right' })
    expect(textOf(findAll(tree, 'code'))).toBe('2')
  })

  test('a loose list keeps its paragraphs', () => {
    expect(findAll(parse('- a\n\n- b'), 'p')).toHaveLength(2)
  })
})
