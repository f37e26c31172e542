/** How a tube's label size is meant. ISO 5366 is the inside diameter in mm; a Jackson size is a plain number, not millimetres. */
export const sizeSystems = ['ISO 5366', 'Jackson'] as const

export type SizeSystem = (typeof sizeSystems)[number]

/** How far a row was checked: read at its source, or from memory. */
export type Mark = 'published' | 'from memory'

/** One Jackson size of the dual-cannula style, in mm. */
export interface JacksonDualRow {
  readonly jackson: number
  readonly idWithInnerMm: number
  readonly idWithoutInnerMm: number
  readonly odMm: number
  readonly mark: Mark
  readonly remark?: string
}

/** One Jackson size of the traditional metal tubes: approximate outside diameter in mm and in Fr. */
export interface JacksonMetalRow {
  readonly jackson: string
  readonly odMm: number
  readonly fr: number
  readonly mark: Mark
}

/**
 * Jackson sizes of dual-cannula tubes, from a university intensive care course. To show beside a tube, never to convert by:
 * the two Jackson tables contradict each other, which is why no number of a tube is ever derived from another.
 */
export const jacksonDual: readonly JacksonDualRow[] = [
  { jackson: 4, idWithInnerMm: 5.0, idWithoutInnerMm: 6.7, odMm: 9.4, mark: 'published' },
  {
    jackson: 6,
    idWithInnerMm: 6.4,
    idWithoutInnerMm: 8.1,
    odMm: 10.8,
    mark: 'published',
    remark:
      'Outside diameter from memory (Hess, Respir Care 2005): the course prints 8.1, which is the inside of the same wall.',
  },
  { jackson: 8, idWithInnerMm: 7.6, idWithoutInnerMm: 9.1, odMm: 12.2, mark: 'published' },
  { jackson: 10, idWithInnerMm: 8.9, idWithoutInnerMm: 10.7, odMm: 13.8, mark: 'published' },
]

/** Jackson sizes of traditional metal tubes, from memory. To show beside a tube, never to convert by. */
export const jacksonMetal: readonly JacksonMetalRow[] = [
  { jackson: '00', odMm: 4.5, fr: 13, mark: 'from memory' },
  { jackson: '0', odMm: 5, fr: 15, mark: 'from memory' },
  { jackson: '1', odMm: 5.5, fr: 16.5, mark: 'from memory' },
  { jackson: '2', odMm: 6, fr: 18, mark: 'from memory' },
  { jackson: '3', odMm: 7, fr: 21, mark: 'from memory' },
  { jackson: '4', odMm: 8, fr: 24, mark: 'from memory' },
  { jackson: '5', odMm: 9, fr: 27, mark: 'from memory' },
  { jackson: '6', odMm: 10, fr: 30, mark: 'from memory' },
  { jackson: '7', odMm: 11, fr: 33, mark: 'from memory' },
  { jackson: '8', odMm: 12, fr: 36, mark: 'from memory' },
  { jackson: '9', odMm: 13, fr: 39, mark: 'from memory' },
  { jackson: '10', odMm: 14, fr: 42, mark: 'from memory' },
]

/** By how much laminar resistance to breathing grows from one inside diameter to another: the fourth power of their ratio (Poiseuille). */
export function laminarResistanceRatio(fromIdMm: number, toIdMm: number): number {
  return (fromIdMm / toIdMm) ** 4
}
