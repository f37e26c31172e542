/** What the last digit of a GS1 number must be, from the digits before it: weights 3, 1, 3 ... from the right (GS1 General Specifications 7.9). */
export function checkDigit(before: string): number {
  const sum = [...before].reverse().reduce((total, digit, i) => total + Number(digit) * (i % 2 === 0 ? 3 : 1), 0)
  return (10 - (sum % 10)) % 10
}

/** Whether a text is digits of which the last is the right check digit, at any length: GTIN, location number or shipping code. */
export function hasCheckDigit(text: string): boolean {
  return /^\d{2,}$/.test(text) && checkDigit(text.slice(0, -1)) === Number(text.slice(-1))
}

/** Whether a text is a trade item number (GTIN) of 8, 12, 13 or 14 digits with the right check digit. */
export function isGtin(text: string): boolean {
  return [8, 12, 13, 14].includes(text.length) && hasCheckDigit(text)
}

/** A GTIN of any length in the 14 digits under which it is kept, filled with zeros from the left; null when it is none. */
export function gtin14(text: string): string | null {
  return isGtin(text) ? text.padStart(14, '0') : null
}
