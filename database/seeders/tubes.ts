import type { TubeData } from '#app/care/tube-change/schema.ts'
import { printedAnswers } from '#app/catalogue/item.ts'
import { demoTube } from './catalogue.ts'

/** What is printed on a tube, before anybody has put it in. */
export type PrintedTube = Omit<
  TubeData,
  'reason' | 'insertedOn' | 'stomaMadeOn' | 'technique' | 'sutures' | 'operator' | 'helper' | 'difficulty' | 'position'
>

const printed = (description: Parameters<typeof demoTube>[0]): PrintedTube => {
  const tube = demoTube(description)
  return { ...printedAnswers(tube), item: tube.id }
}

const corvane = { line: 'Corvane Dual', cuff: 'air', fenestrated: 'no' } as const
const halden = { line: 'Halden', size: '6', fenestrated: 'no' } as const

/** The tubes of the demo hospital by short names; each is one of the catalogue. */
export const printedTubes = {
  'corvane 7': printed({ ...corvane, size: '7.0' }),
  'corvane 8': printed({ ...corvane, size: '8.0' }),
  'corvane 9': printed({ ...corvane, size: '9.0' }),
  'halden 6': printed({ ...halden, cuff: 'none' }),
  'halden 6 cuffed': printed({ ...halden, cuff: 'air' }),
  'halden 4 fenestrated': printed({ line: 'Halden', size: '4', fenestrated: 'yes', cuff: 'none' }),
  linnet: printed({ line: 'Linnet', size: '7.5', cuff: 'air' }),
  'linnet water': printed({ line: 'Linnet', size: '7.0', cuff: 'water' }),
  'linnet short': printed({ line: 'Linnet', size: '10.0', cuff: 'none', lengthMm: 55 }),
  marrow: { ...printed({ line: 'Marrow Long', size: '7.5', cuff: 'air' }), flangeMarkCm: 9.5 },
} as const satisfies Readonly<Record<string, PrintedTube>>

export type TubeName = keyof typeof printedTubes

/** Lot and expiry of a device that was unpacked at a moment: a ward takes one delivery of each a month, and all of it is one lot. */
export function packOf({ line, size }: Pick<PrintedTube, 'line' | 'size'>, at: Date) {
  const month = at.toISOString().slice(0, 7)
  const lot = `${line.charAt(0)}${size}-${month.slice(2).replace('-', '')}`
  return { lot, expiresOn: `${Number(month.slice(0, 4)) + 3}${month.slice(4)}-28` }
}
