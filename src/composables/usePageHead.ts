import { useHead } from '@unhead/vue'
import { computed, toValue, type MaybeRefOrGetter } from 'vue'
import { useRoute } from 'vue-router'
import { usePageContext } from './page-context.js'

export interface PageHead {
  /** Without the product's name. */
  title: string
  description: string
  /** Path of the page's one true address; the route's own path when left out. */
  path?: string
  /** Open Graph type; `website` when left out. */
  type?: 'website' | 'article'
  /** schema.org description, without its @context. */
  jsonLd?: Record<string, unknown> | null
  /** For pages that search engines should leave alone. */
  isUnlisted?: boolean
}

/** Sets title, description, canonical address, link preview and JSON-LD of a page. */
export function usePageHead(head: MaybeRefOrGetter<PageHead>): void {
  const context = usePageContext()
  const route = useRoute()
  // Resolved once: while a page is left, the route already names the next one.
  const ownPath = route.path
  const page = computed(() => toValue(head))
  const title = computed(() => `${page.value.title} · Mossgauge`)
  const address = computed(() => context.origin + (page.value.path ?? ownPath))
  useHead({
    title: () => title.value,
    meta: [
      { name: 'description', content: () => page.value.description },
      { name: 'robots', content: () => (page.value.isUnlisted ? 'noindex' : 'index, follow') },
      { property: 'og:site_name', content: 'Mossgauge' },
      { property: 'og:title', content: () => page.value.title },
      { property: 'og:description', content: () => page.value.description },
      { property: 'og:type', content: () => page.value.type ?? 'website' },
      { property: 'og:url', content: () => address.value },
      { name: 'twitter:card', content: 'summary' },
    ],
    link: [{ rel: 'canonical', href: () => address.value }],
    script: computed(() =>
      page.value.jsonLd
        ? [
            {
              key: 'json-ld',
              type: 'application/ld+json',
              textContent: JSON.stringify({ '@context': 'https://schema.org', ...page.value.jsonLd }),
            },
          ]
        : [],
    ),
  })
}
