/** A DOI as it is compared and stored: lower case, without resolver address or prefix; null when the text is no DOI. */
export function toDoiKey(text: string | null): string | null {
  const bare = (text ?? '')
    .trim()
    .toLowerCase()
    .replace(/^(?:https?:\/\/(?:dx\.)?doi\.org\/|doi:\s*)/, '')
  return /^10\.\d{4,9}\/\S+$/.test(bare) ? bare : null
}
