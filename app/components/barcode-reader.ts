import { prepareZXingModule, readBarcodes } from 'zxing-wasm/reader'
// Served from here: by default the reader is fetched from elsewhere, which the content security policy refuses.
import wasmUrl from 'zxing-wasm/reader/zxing_reader.wasm?url'

prepareZXingModule({ overrides: { locateFile: () => wasmUrl } })

/** The first code in a picture, as a scanner would send it: symbology identifier, text, group separators. Null when there is none. */
export async function codeIn(picture: ImageData): Promise<string | null> {
  // The default text mode would put brackets where the separators are.
  const [code] = await readBarcodes(picture, { textMode: 'Plain', tryHarder: true, maxNumberOfSymbols: 1 })
  return code?.isValid ? code.symbologyIdentifier + code.text : null
}
