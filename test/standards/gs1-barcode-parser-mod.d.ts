/** The part of gs1-barcode-parser-mod that our checks use; it ships no types. Refuses by throwing. */
declare module 'gs1-barcode-parser-mod' {
  export interface ParsedElement {
    readonly ai: string
    readonly raw: string
    /** The date as '2026-12-01'; empty where the element is none. */
    readonly isoDate: string
  }
  export function parseBarcode(code: string): { codeName: string; parsedCodeItems: readonly ParsedElement[] }
}
