import bwipjs from 'bwip-js/node'
import { TEST_CODE } from './test-code.ts'

/** The test symbol as the path of an SVG, one unit a module, with its width and height. */
export function testSymbol(): { readonly path: string; readonly width: number; readonly height: number } {
  const [symbol] = bwipjs.raw({ bcid: 'gs1datamatrix', text: TEST_CODE }) as unknown as Matrix[]
  if (!symbol) throw new Error('The test symbol could not be drawn')
  const { pixs, pixx, pixy } = symbol
  const dark = [...pixs].flatMap((pixel, i) => (pixel === 1 ? [`M${i % pixx} ${Math.floor(i / pixx)}h1v1h-1z`] : []))
  return { path: dark.join(''), width: pixx, height: pixy }
}

interface Matrix {
  readonly pixs: readonly number[]
  readonly pixx: number
  readonly pixy: number
}
