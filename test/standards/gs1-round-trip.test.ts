// From a printed code to an item: bwip-js draws it, zxing-wasm reads the picture, the parser reads what it sent.
import { readFileSync } from 'node:fs'
import { toBuffer } from 'bwip-js/node'
import { beforeAll, expect, test } from 'vitest'
import { prepareZXingModule, readBarcodes } from 'zxing-wasm/reader'
import { type Gs1Scan, itemOf } from '#app/clinical/gs1-scan.ts'

const today = '2026-12-01'

beforeAll(() => {
  const wasm = new URL(import.meta.resolve('zxing-wasm/reader/zxing_reader.wasm'))
  prepareZXingModule({ overrides: { wasmBinary: new Uint8Array(readFileSync(wasm)).buffer } })
})

async function photographed(bcid: string, text: string): Promise<Gs1Scan> {
  const picture = await toBuffer({ bcid, text, scale: 3, padding: 10, backgroundcolor: 'FFFFFF' })
  // The default text mode would put brackets where the separators are.
  const [code] = await readBarcodes(new Uint8Array(picture), { textMode: 'Plain', tryHarder: true })
  if (!code) throw new Error(`No code found in a picture of ${bcid}`)
  return { raw: code.symbologyIdentifier + code.text, entry: 'barcode', sendsSeparator: true }
}

const symbologies = [
  ['gs1datamatrix', ']d2'],
  ['gs1datamatrixrectangular', ']d2'],
  ['gs1-128', ']C1'],
  ['gs1qrcode', ']Q3'],
] as const

// No % beside small letters: bwip-js 4.11.4 doubles it in byte mode of a QR code, where nothing undoes that.
const labels = [
  ['(01)09521234543213(10)123/A(17)271231(21)S7', { lot: '123/A', serial: 'S7', expiresOn: '2027-12-31' }],
  ['(01)09521234543213(21)0017(11)261100(10)17271231', { serial: '0017', lot: '17271231', productionMonthOnly: true }],
  ['(01)09521234543213(240)R-1(10)ab_?+(17)280200', { lot: 'ab_?+', expiresOn: '2028-02-29', expiryMonthOnly: true }],
] as const

test.each(symbologies.flatMap(([bcid, id]) => labels.map(([text, parts]) => [bcid, text, id, parts] as const)))(
  '%s with %s keeps its separator inside',
  async (bcid, text, id, parts) => {
    const scan = await photographed(bcid, text)
    expect(scan.raw.startsWith(id)).toBe(true)
    expect(scan.raw).toContain('\u001d')
    expect(itemOf([scan], today)).toMatchObject({
      ok: true,
      item: { gtin: '09521234543213', ...parts, separatorMissing: null },
    })
  },
)

test.each([
  ['ean13', '9521234543213', ']E0', '09521234543213'],
  ['ean8', '09521230', ']E4', '00000009521230'],
])('a picture of %s is a bare item number', async (bcid, text, id, gtin) => {
  const scan = await photographed(bcid, text)
  expect(scan.raw.startsWith(id)).toBe(true)
  expect(itemOf([scan], today)).toMatchObject({ item: { gtin, lot: null } })
})

test.each(['datamatrix', 'qrcode', 'code128'])('a picture of %s without GS1 data is refused', async bcid => {
  const scan = await photographed(bcid, '0109521234543213')
  expect(itemOf([scan], today)).toMatchObject({ ok: false, at: 0, says: expect.stringMatching(/not in GS1 form/) })
})

test('two linear codes on one label make one item', async () => {
  const codes = [
    await photographed('gs1-128', '(01)09521234543213'),
    await photographed('gs1-128', '(01)09521234543213(10)AB(17)271231'),
  ]
  expect(itemOf(codes, today)).toMatchObject({ item: { gtin: '09521234543213', lot: 'AB', expiresOn: '2027-12-31' } })
})
