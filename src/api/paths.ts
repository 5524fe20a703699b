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

/** `query` is a formatted search query without its question mark. */
export function searchPath(query: string): string {
  return query ? `/species?${query}` : '/species'
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
  query: { quantity?: string; lifeStage?: string; source?: string | null; cursor?: string | null },
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
