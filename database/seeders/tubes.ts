import type { TubeData } from '#app/care/tube-change/schema.ts'

/** What is printed on a tube, before anybody has put it in. */
export type PrintedTube = Omit<
  TubeData,
  'reason' | 'insertedOn' | 'stomaMadeOn' | 'technique' | 'sutures' | 'operator' | 'helper' | 'difficulty' | 'position'
>

const plain = { sizeSystem: 'ISO 5366', fenestrated: 'no', connector: 'outer', flange: 'fixed' } as const

// Invented lines and numbers; no maker's tube is meant. Corvane is the line whose label allows 29 days.
const corvane = {
  ...plain,
  line: 'Corvane Dual',
  construction: 'dual',
  innerCannula: 'disposable',
  longestUseDays: 29,
} as const
const halden = {
  line: 'Halden',
  sizeSystem: 'Jackson',
  construction: 'dual',
  innerCannula: 'reusable',
  connector: 'inner',
  flange: 'fixed',
  fenestrated: 'no',
} as const

/** The tubes of the demo hospital by short names. */
export const printedTubes = {
  'corvane 7': { ...corvane, size: '7.0', idWithInner: 7, idWithoutInner: 8, od: 10.3, lengthMm: 74, cuff: 'air' },
  'corvane 8': { ...corvane, size: '8.0', idWithInner: 8, idWithoutInner: 9, od: 11.3, lengthMm: 78, cuff: 'air' },
  'corvane 9': { ...corvane, size: '9.0', idWithInner: 9, idWithoutInner: 10, od: 12.3, lengthMm: 81, cuff: 'air' },
  'halden 6': { ...halden, size: '6', idWithInner: 6.4, idWithoutInner: 8.1, od: 10.8, lengthMm: 76, cuff: 'none' },
  'halden 6 cuffed': {
    ...halden,
    size: '6',
    idWithInner: 6.4,
    idWithoutInner: 8.1,
    od: 10.8,
    lengthMm: 76,
    cuff: 'air',
  },
  'halden 4 fenestrated': {
    ...halden,
    size: '4',
    idWithInner: 5,
    idWithoutInner: 6.7,
    od: 9.4,
    lengthMm: 65,
    cuff: 'none',
    fenestrated: 'yes',
  },
  linnet: {
    ...plain,
    line: 'Linnet',
    size: '7.5',
    idWithoutInner: 7.5,
    od: 10.2,
    lengthMm: 77,
    cuff: 'air',
    construction: 'single',
  },
  marrow: {
    ...plain,
    line: 'Marrow Long',
    size: '7.5',
    idWithoutInner: 7.5,
    od: 10.4,
    lengthMm: 110,
    cuff: 'air',
    construction: 'single',
    flange: 'adjustable',
    flangeMarkCm: 9.5,
  },
  tarn: {
    ...plain,
    line: 'Tarn',
    size: '7.0',
    idWithoutInner: 7,
    od: 10,
    lengthMm: 80,
    cuff: 'water',
    construction: 'single',
  },
  orrin: {
    ...plain,
    line: 'Orrin Short',
    size: '10.0',
    idWithoutInner: 10,
    od: 12.5,
    lengthMm: 55,
    cuff: 'none',
    construction: 'single',
  },
} as const satisfies Readonly<Record<string, PrintedTube>>

export type TubeName = keyof typeof printedTubes
