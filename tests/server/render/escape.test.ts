import { describe, expect, it } from 'vitest'
import { escapeHtml } from '../../../server/render/escape.js'

describe('escapeHtml', () => {
  it('leaves nothing that could open a tag or end an attribute', () => {
    expect(escapeHtml(`<a href="x" id='y'>&`)).toBe('&lt;a href=&quot;x&quot; id=&#39;y&#39;&gt;&amp;')
  })
})
