/** Addresses of the API's reads, below /api/v1; only this folder knows them. */

function withQuery(path: string, query: Record<string, string | number | null | undefined>): string {
  const parameters = new URLSearchParams()
  for (const [name, value] of Object.entries(query)) {
    if (value != null && value !== '') parameters.set(name, String(value))
  }
  const text = parameters.toString()
  return text ? `${path}?${text}` : path
}

export function homePath(): string {
  return '/home'
}

/** `search` is a search written as the end of an address: empty, or from its question mark on. */
export function searchPath(search: string): string {
  return `/species${search}`
}

export function speciesPath(slug: string, revision?: number | string | null): string {
  return withQuery(`/species/${encodeURIComponent(slug)}`, { revision })
}

export function revisionsPath(slug: string, cursor?: string | null): string {
  return withQuery(`/species/${encodeURIComponent(slug)}/revisions`, { cursor })
}

export function physiologyRecordsPath(
  slug: string,
  itemId: string,
  query: {
    quantity?: string
    lethalPercent?: number | null
    lifeStage?: string
    level?: string
    source?: string | null
    revision?: number | null
    cursor?: string | null
  },
): string {
  return withQuery(
    `/species/${encodeURIComponent(slug)}/physiology/${encodeURIComponent(itemId)}/records`,
    query,
  )
}

export function sourcesPath(q?: string | null, cursor?: string | null): string {
  return withQuery('/sources', { q, cursor })
}

export function sourcePath(id: string, cursor?: string | null): string {
  return withQuery(`/sources/${encodeURIComponent(id)}`, { cursor })
}

export function attributionsPath(): string {
  return '/attributions'
}
