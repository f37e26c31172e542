/** Free words as a sentence of a summary: they end with a full stop, unless the writer ended them otherwise. */
export function sentence(words: string): string {
  return /[.?!]$/.test(words) ? words : `${words}.`
}
