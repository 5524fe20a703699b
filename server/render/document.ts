import type { PageDocument, RenderedPage } from './page-renderer.js'

const HTML_TAG = /<html[^>]*>/
const BODY_TAG = /<body[^>]*>/
const PLACES = ['<!--head-->', '<!--app-->', '<!--state-->'] as const

/**
 * Puts a rendered page into the client's shell: styles and head tags, the markup, and the state its script starts from.
 * `links` are further head tags, of the files this page will need.
 */
export function assembleDocument(shell: string, page: RenderedPage, links: string): PageDocument {
  const missing = PLACES.find((place) => !shell.includes(place))
  if (missing !== undefined) throw new Error(`The client's shell has no ${missing}.`)
  const state = `<script type="application/json" id="page-state">${page.state}</script>`
  // The last place first, so that no piece is taken for a place; by functions, so that no dollar sign is a pattern.
  const html = shell
    .replace(HTML_TAG, (tag) => writeTag('html', page.htmlAttrs, tag))
    .replace(BODY_TAG, (tag) => writeTag('body', page.bodyAttrs, tag))
    .replace('<!--state-->', () => state)
    .replace('<!--app-->', () => page.html)
    // After the shell's own styles, as where the browser loads them: the order decides between equals.
    .replace('</head>', () => `${links}</head>`)
    .replace('<!--head-->', () => [page.headTags, page.css].join('\n'))
  return { status: page.status, location: page.location, html, cacheable: page.cacheable }
}

/** The page's own tag, or the shell's where the page has nothing to say. */
function writeTag(name: string, attributes: string, shellTag: string): string {
  return attributes.trim() === '' ? shellTag : `<${name} ${attributes.trim()}>`
}
