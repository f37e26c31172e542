import { readSymbol } from '#app/clinical/gs1.ts'

/** What stands in the test code of the set-up page: the serial number tells whether the separator before it came through. */
export const TEST_LOT = 'SETUP'
export const TEST_SERIAL = 'SEPARATOR'
export const TEST_CODE = `(01)09521234543213(10)${TEST_LOT}(21)${TEST_SERIAL}`

// No date in the code, so that any day will do to read it by.
const ANY_DAY = '2026-12-01'

/** Whether a scanner sent the test code whole, and what to do about it if not. */
export function isWholeTestCode(raw: string): { readonly isWhole: boolean; readonly says: string } {
  const reading = readSymbol(raw, 'barcode', ANY_DAY)
  const value = (ai: string) =>
    reading.ok ? reading.symbol.elements.find(element => element.ai === ai)?.value : undefined
  const isTyped = reading.ok && reading.symbol.form === 'bracketed'
  if (value('10') === TEST_LOT && value('21') === TEST_SERIAL && !isTyped) {
    return {
      isWhole: true,
      says: 'The code came whole, with its separator. This scanner is trusted on this workstation.',
    }
  }
  if (value('10')?.startsWith(TEST_LOT)) {
    return {
      isWhole: false,
      says: 'The separator did not come through. Set the scanner to send it, or choose the key it sends below, and scan again.',
    }
  }
  return { isWhole: false, says: 'This is not the test code. Scan the code on this page.' }
}
