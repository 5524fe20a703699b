/** The ids of the sources that a section of prose cites as `[@source-id]` or `[@source-id, locator]`, each once, in order. */
export function findCitedSources(markdown: string): string[] {
  const ids = [...markdown.matchAll(/\[@([0-9a-f]{8}(?:-[0-9a-f]{4}){3}-[0-9a-f]{12})(?=[\],])/gi)].map(
    (match) => (match[1] ?? '').toLowerCase(),
  )
  return [...new Set(ids)]
}
