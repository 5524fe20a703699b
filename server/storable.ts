/** Whether PostgreSQL can hold every text of a JSON value: it stores neither a zero character nor half a surrogate pair. */
export function isStorable(content: unknown): boolean {
  const withoutBackslashes = JSON.stringify(content).replaceAll('\\\\', '')
  return !/\\u(?:0000|d[89a-f][0-9a-f]{2})/i.test(withoutBackslashes)
}
