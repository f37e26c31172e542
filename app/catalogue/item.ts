import type { TubeData } from '../care/tube-change/schema.ts'

/** What a tube line is called on the flange, and who makes it. */
export interface TubeLine {
  readonly id: string
  readonly line: string
  readonly maker: string
}

/** What every item of the catalogue has: its line, and whether it is still bought. */
interface Item {
  readonly id: string
  readonly lineId: string
  readonly line: string
  readonly maker: string
  /** As on the label. */
  readonly size: string
  /** Fourteen digits; null when the label carries none. */
  readonly gtin: string | null
  readonly retiredAt: Date | null
  /** Raised by each edit, so that two at once are noticed. */
  readonly version: number
}

/**
 * A tube as its maker describes it, in the words and units (mm, days) of a charted tube. Null: a single cannula has no inner
 * one, a label may give no longest use.
 */
export interface CatalogueTube
  extends Item,
    Pick<
      TubeData,
      | 'sizeSystem'
      | 'construction'
      | 'idWithoutInner'
      | 'od'
      | 'lengthMm'
      | 'cuff'
      | 'fenestrated'
      | 'connector'
      | 'flange'
    > {
  readonly innerCannula: InnerCannulaUse | null
  readonly idWithInner: number | null
  readonly longestUseDays: number | null
  /** Whether an obturator comes with it. */
  readonly insertionAid: boolean
  /** How many reusable inner cannulas come with it. */
  readonly reusableInnerCannulas: number
}

export type InnerCannulaUse = 'disposable' | 'reusable'

/** An inner cannula as its maker describes it. */
export interface CatalogueInnerCannula extends Item {
  readonly use: InnerCannulaUse
  readonly fenestrated: TubeData['fenestrated']
  /** How many are in a box. */
  readonly packSize: number
}

/** What tells one tube from another, as a form and the catalogue both name it. */
export type PrintedName =
  | 'line'
  | 'size'
  | 'sizeSystem'
  | 'construction'
  | 'innerCannula'
  | 'idWithInner'
  | 'idWithoutInner'
  | 'od'
  | 'lengthMm'
  | 'cuff'
  | 'fenestrated'
  | 'connector'
  | 'flange'

/** What a tube-change form asks of the tube itself, from the catalogue: what is read on this one tube, such as lot and flange mark, is left out. */
export type PrintedAnswers = Pick<TubeData, PrintedName | 'longestUseDays'>

/** The answers of a tube-change form that follow from which tube it is. */
export function printedAnswers(tube: CatalogueTube): PrintedAnswers {
  const { line, sizeSystem, size, construction, innerCannula, idWithInner, idWithoutInner, od, lengthMm } = tube
  const { cuff, fenestrated, connector, flange, longestUseDays } = tube
  return {
    ...{ line, sizeSystem, size, construction, idWithoutInner, od, lengthMm, cuff, fenestrated, connector, flange },
    ...(innerCannula === null ? {} : { innerCannula }),
    ...(idWithInner === null ? {} : { idWithInner }),
    ...(longestUseDays === null ? {} : { longestUseDays }),
  }
}

/** A tube as far as its name says which it is. */
export type NamedTube = Pick<CatalogueTube, Exclude<PrintedName, 'idWithInner' | 'idWithoutInner' | 'od'>>

/**
 * What a tube is called wherever it is named: no two tubes of a catalogue are called the same. What is usual is left unsaid:
 * `Corvane Dual 8.0 ISO 5366, dual (disposable), air cuff, 78 mm`.
 */
export function tubeName(tube: NamedTube): string {
  const { line, size, sizeSystem, construction, innerCannula, cuff, fenestrated, flange, connector, lengthMm } = tube
  return [
    `${line} ${size} ${sizeSystem}`,
    ...(construction === 'dual' ? [innerCannula === null ? 'dual' : `dual (${innerCannula})`] : []),
    cuff === 'none' ? 'no cuff' : `${cuff} cuff`,
    ...(fenestrated === 'yes' ? ['fenestrated'] : []),
    ...(flange === 'adjustable' ? ['adjustable flange'] : []),
    ...(connector === 'outer' ? [] : [connector === 'inner' ? 'connector on the inner cannula' : 'no connector']),
    `${lengthMm} mm`,
  ].join(', ')
}

/** Several tubes in few words: those of one line and size together, with how many kinds there are. */
export function tubesInWords(tubes: readonly NamedTube[]): string {
  const sizeOf = ({ line, size, sizeSystem }: NamedTube) => `${line} ${size} ${sizeSystem}`
  const sizes = [...new Set(tubes.map(sizeOf))].map(size => {
    const [first, ...others] = tubes.filter(tube => sizeOf(tube) === size)
    return first && others.length === 0 ? tubeName(first) : `${size}, ${others.length + 1} kinds`
  })
  return sizes.join('; ')
}

/** What an inner cannula is called wherever it is named: `Corvane Dual 8.0, disposable, fenestrated, box of 10`. */
export function innerCannulaName(
  cannula: Pick<CatalogueInnerCannula, 'line' | 'size' | 'use' | 'fenestrated' | 'packSize'>,
): string {
  const { line, size, use, fenestrated, packSize } = cannula
  return [
    `${line} ${size}`,
    use,
    ...(fenestrated === 'yes' ? ['fenestrated'] : []),
    ...(packSize === 1 ? [] : [`box of ${packSize}`]),
  ].join(', ')
}
