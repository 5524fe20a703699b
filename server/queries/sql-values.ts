/** The values of a statement in the making; each is named in its text by the number it gets. */
export class SqlValues {
  readonly values: unknown[] = []

  /** Takes a value and gives its place in the text, such as `$3`. */
  add(value: unknown): string {
    this.values.push(value)
    return `$${this.values.length}`
  }
}
