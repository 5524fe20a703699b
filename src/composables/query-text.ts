/** The one text of a route's parameter or query value, the first where it is repeated; null where there is none. */
export function toSingleText(value: string | null | undefined | readonly (string | null)[]): string | null {
  const [first] = [value].flat()
  return first == null || first === '' ? null : first
}
