import barcodes from 'bwip-js/node'

/** A QR symbol: `size` modules on a side, and those that are dark by row and column. */
export interface QrSymbol {
  readonly size: number
  readonly dark: readonly { readonly x: number; readonly y: number }[]
}

/** The QR symbol of an address, which still reads after a photocopy has lost some of it. */
export function qrSymbol(address: string): QrSymbol {
  const asked = { bcid: 'qrcode', text: address, eclevel: 'Q' } // its types know no options of single codes
  const [symbol] = barcodes.raw(asked)
  if (!symbol || !('pixs' in symbol)) throw new Error('No QR symbol was made')
  const { pixs, pixx } = symbol
  const dark = pixs.flatMap((pixel, at) => (pixel === 1 ? [{ x: at % pixx, y: Math.floor(at / pixx) }] : []))
  return { size: pixx, dark }
}

/** The same as the path of a drawing with one unit for a module. */
export function qrPath({ dark }: QrSymbol): string {
  return dark.map(({ x, y }) => `M${x} ${y}h1v1h-1z`).join('')
}
