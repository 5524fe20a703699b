import createMarkdownIt from 'markdown-it'
import type { MarkdownIt, Token } from 'markdown-it'

/** A piece of prose as a small tree, so that a page can build its own elements and no HTML ever passes through. */
export type ProseNode = string | ProseElement

export interface ProseElement {
  tag: ProseTag
  attributes: Record<string, string>
  children: ProseNode[]
}

const PROSE_TAGS = [
  'p',
  'h3',
  'h4',
  'h5',
  'h6',
  'ul',
  'ol',
  'li',
  'blockquote',
  'pre',
  'code',
  'em',
  'strong',
  's',
  'a',
  'br',
  'hr',
  'table',
  'thead',
  'tbody',
  'tr',
  'th',
  'td',
  'sup',
  'span',
] as const
export type ProseTag = (typeof PROSE_TAGS)[number]

/** What a citation turns into: the number of the source on this page and the address of its entry in the list. */
export interface ResolvedCitation {
  label: string
  address: string
  title: string
}

/** Finds the source of a citation by its id; null when the page does not have it. */
export type CitationResolver = (sourceId: string) => ResolvedCitation | null

const CITATION = /^\[@([0-9a-z][0-9a-z-]*)(?:,\s*([^\]\n]{1,120}))?\]/i
/** Links of contributors gain nothing from us and say so. */
const LINK_RELATION = 'nofollow ugc noopener'
const FIRST_HEADING = 3
const LAST_HEADING = 6

function createParser(): MarkdownIt {
  const parser = createMarkdownIt('default', { html: false, linkify: false, typographer: false })
  // A picture is an item of its own with licence and credit; one in the text would also be fetched from outside.
  parser.disable(['image'])
  parser.validateLink = (url) => /^(?:https?:\/\/|mailto:|\/(?!\/)|#)/i.test(url.trim())
  parser.inline.ruler.before('link', 'citation', (state, silent) => {
    const match = CITATION.exec(state.src.slice(state.pos, state.posMax))
    if (match === null) return false
    if (!silent) {
      const token = state.push('citation', '', 0)
      token.content = match[1] ?? ''
      token.info = match[2]?.trim() ?? ''
    }
    state.pos += match[0].length
    return true
  })
  return parser
}

const parser = createParser()

function isProseTag(tag: string): tag is ProseTag {
  return PROSE_TAGS.some((known) => known === tag)
}

/** Headings keep their order but start right under the section's own: the first level used becomes `h3`. */
function rankHeadings(tokens: readonly Token[]): Map<string, ProseTag> {
  const used = [
    ...new Set(tokens.filter((token) => token.type === 'heading_open').map((token) => token.tag)),
  ].sort()
  return new Map(
    used.map((tag, rank) => {
      const shown = `h${Math.min(LAST_HEADING, FIRST_HEADING + rank)}`
      return [tag, isProseTag(shown) ? shown : 'h6']
    }),
  )
}

function citationNode(sourceId: string, locatorText: string, resolve: CitationResolver): ProseElement {
  const found = resolve(sourceId)
  const locator = locatorText === '' ? '' : `, ${locatorText}`
  if (found === null) {
    return { tag: 'span', attributes: {}, children: [`[source not on this page${locator}]`] }
  }
  return {
    tag: 'a',
    attributes: { href: found.address, title: found.title },
    children: [`[${found.label}${locator}]`],
  }
}

function attributesOf(token: Token): Record<string, string> {
  if (token.type === 'link_open') {
    const href = String(token.attrGet('href') ?? '')
    return href.startsWith('/') || href.startsWith('#') ? { href } : { href, rel: LINK_RELATION }
  }
  if (token.type === 'ordered_list_open') {
    const start = token.attrGet('start')
    return start === null ? {} : { start: String(start) }
  }
  if (token.tag === 'th' || token.tag === 'td') {
    const style = String(token.attrGet('style') ?? '')
    const align = /text-align:(\w+)/.exec(style)?.[1]
    return align === undefined ? {} : { 'data-align': align }
  }
  return {}
}

/** Reads a flat list of tokens into a tree; a token of no known kind gives its text alone. */
function toTree(
  tokens: readonly Token[],
  resolve: CitationResolver,
  headings: Map<string, ProseTag>,
): ProseNode[] {
  const root: ProseNode[] = []
  const open: { children: ProseNode[] }[] = [{ children: root }]
  const here = () => open.at(-1)?.children ?? root
  for (const token of tokens) {
    if (token.type === 'inline') {
      here().push(...toTree(token.children ?? [], resolve, headings))
    } else if (token.type === 'citation') {
      here().push(citationNode(token.content, token.info, resolve))
    } else if (token.nesting === 1) {
      const tag = headings.get(token.tag) ?? token.tag
      const children: ProseNode[] = []
      // A tight list hides its paragraphs; their text belongs to the item itself.
      if (token.hidden || !isProseTag(tag)) {
        open.push({ children: here() })
        continue
      }
      here().push({ tag, attributes: attributesOf(token), children })
      open.push({ children })
    } else if (token.nesting === -1) {
      if (open.length > 1) open.pop()
    } else if (token.type === 'softbreak') {
      here().push('\n')
    } else if (token.type === 'hardbreak') {
      here().push({ tag: 'br', attributes: {}, children: [] })
    } else if (token.type === 'hr') {
      here().push({ tag: 'hr', attributes: {}, children: [] })
    } else if (token.type === 'code_inline') {
      here().push({ tag: 'code', attributes: {}, children: [token.content] })
    } else if (token.type === 'fence' || token.type === 'code_block') {
      const code: ProseElement = { tag: 'code', attributes: {}, children: [token.content] }
      here().push({ tag: 'pre', attributes: {}, children: [code] })
    } else if (token.content !== '') {
      here().push(token.content)
    }
  }
  return root
}

/**
 * Reads a section of prose (Markdown without raw HTML) into a tree. Citations `[@source-id, p. 3]` are resolved by the
 * caller, since only the page knows its sources. Links out carry `rel="nofollow ugc noopener"`; pictures are not read.
 */
export function parseProse(markdown: string, resolve: CitationResolver): ProseNode[] {
  const tokens = parser.parse(markdown, {})
  return toTree(tokens, resolve, rankHeadings(tokens))
}
