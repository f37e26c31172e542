/**
 * Whether two texts as printed on devices say the same, but for case, spaces and a trailing zero: `8` is the size that another
 * label prints as `8.0`.
 */
export function isPrintedAlike(one: string, other: string): boolean {
  return plain(one) === plain(other)
}

function plain(words: string): string {
  const text = words.trim().replaceAll(/\s+/g, ' ').toLowerCase()
  return /^\d+([.,]\d+)?$/.test(text) ? String(Number(text.replace(',', '.'))) : text
}
