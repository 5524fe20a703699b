import { describe, expect, it } from 'vitest'
import { writeLinks } from '../../../server/render/build-renderer.js'
import { assembleDocument } from '../../../server/render/document.js'
import type { RenderedPage } from '../../../server/render/page-renderer.js'

const SHELL =
  '<!doctype html><html lang="en"><head><!--head--></head><body><div id="app"><!--app--></div><!--state--></body></html>'
const PAGE: RenderedPage = {
  status: 200,
  location: null,
  html: '<main>Page</main>',
  headTags: '<title>Title</title>',
  htmlAttrs: ' lang="en" data-theme="dark"',
  bodyAttrs: '',
  state: '{"a":1}',
  css: '<style>a{}</style>',
  cacheable: true,
  modules: [],
}

describe('assembleDocument', () => {
  it('puts each piece in its place', () => {
    expect(assembleDocument(SHELL, PAGE, '<link rel="x" />')).toEqual({
      status: 200,
      location: null,
      cacheable: true,
      html: [
        '<!doctype html><html lang="en" data-theme="dark"><head><title>Title</title>',
        '<style>a{}</style><link rel="x" /></head><body><div id="app"><main>Page</main></div>' +
          '<script type="application/json" id="page-state">{"a":1}</script></body></html>',
      ].join('\n'),
    })
  })

  it('takes a page as it is, even where its text looks like a place or a pattern', () => {
    const html = "<p>$& $' <!--head--> <!--state--></p>"
    const { html: document } = assembleDocument(SHELL, { ...PAGE, html, state: '"$1 <!--app-->"' }, '')
    expect(document).toContain(`<div id="app">${html}</div>`)
    expect(document).toContain('id="page-state">"$1 <!--app-->"</script>')
  })

  it('refuses a shell without a place for the page', () => {
    expect(() => assembleDocument('<html></html>', PAGE, '')).toThrow('<!--head-->')
  })
})

describe('writeLinks', () => {
  it("asks for the page's own styles and scripts once, and not for what the shell asks for", () => {
    const files = {
      'src/a.vue': ['/assets/a.js', '/assets/a.css', '/assets/shared.js'],
      'src/b.vue': ['/assets/b.js', '/assets/shared.js', '/assets/entry.js', '/assets/f.woff2'],
    }
    const shell = '<script type="module" src="/assets/entry.js"></script>'
    expect(writeLinks(['src/a.vue', 'src/b.vue', 'src/unknown.vue'], files, shell).split('\n')).toEqual([
      '<link rel="stylesheet" href="/assets/a.css" />',
      '<link rel="modulepreload" href="/assets/a.js" />',
      '<link rel="modulepreload" href="/assets/shared.js" />',
      '<link rel="modulepreload" href="/assets/b.js" />',
    ])
  })
})
