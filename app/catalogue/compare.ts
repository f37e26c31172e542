import type { TubeData } from '../care/tube-change/schema.ts'
import { laminarResistanceRatio } from '../clinical/sizes.ts'
import { type CatheterRule, largestCatheter, quickRuleFr } from '../clinical/suction-catheter.ts'
import type { CatalogueTube, PrintedName } from './item.ts'

/** The numbers that two tubes are compared by. A tube that is not of the catalogue has them too. */
export type ComparedTube = Pick<CatalogueTube, PrintedName>

/** A charted tube as the catalogue would describe it. */
export function comparedOf(tube: TubeData): ComparedTube {
  const innerCannula = tube.innerCannula === 'none' ? null : (tube.innerCannula ?? null)
  return { ...tube, innerCannula, idWithInner: tube.idWithInner ?? null }
}

/** The inside diameter that breath and a suction catheter meet, in mm: with the inner cannula in, where the tube has one. */
export function breathedIdMm({ idWithInner, idWithoutInner }: ComparedTube): number {
  return idWithInner ?? idWithoutInner
}

/** A candidate beside the present tube. Differences are candidate less present, in mm. */
export interface Comparison<Tube extends ComparedTube> {
  readonly tube: Tube
  readonly odMm: number
  readonly idMm: number
  readonly lengthMm: number
  /** Times the present tube's, by the fourth power of the inside diameters (laminar flow: an approximation). */
  readonly resistance: number
  readonly isSameCuff: boolean
  readonly isSameConnector: boolean
  /** False: the inner cannulas at the bed are of no use with it. */
  readonly isSameLine: boolean
}

const tenths = (value: number): number => Math.round(value * 10) / 10

/** The differences of one candidate. */
export function comparison<Tube extends ComparedTube>(present: ComparedTube, tube: Tube): Comparison<Tube> {
  return {
    tube,
    odMm: tenths(tube.od - present.od),
    idMm: tenths(breathedIdMm(tube) - breathedIdMm(present)),
    lengthMm: tenths(tube.lengthMm - present.lengthMm),
    resistance: laminarResistanceRatio(breathedIdMm(present), breathedIdMm(tube)),
    isSameCuff: tube.cuff === present.cuff,
    isSameConnector: tube.connector === present.connector,
    isSameLine: tube.line === present.line,
  }
}

/**
 * Candidates by nearest outside diameter, then inside diameter with the inner cannula in, then length, then same cuff, then same
 * connector. An order to look in, and no more: no size is converted, and none is said to be the same.
 */
export function nearest<Tube extends ComparedTube>(
  present: ComparedTube,
  candidates: readonly Tube[],
): readonly Comparison<Tube>[] {
  const keys = ({ odMm, idMm, lengthMm, isSameCuff, isSameConnector }: Comparison<Tube>) => [
    Math.abs(odMm),
    Math.abs(idMm),
    Math.abs(lengthMm),
    isSameCuff ? 0 : 1,
    isSameConnector ? 0 : 1,
  ]
  return candidates
    .map(tube => comparison(present, tube))
    .toSorted((a, b) => {
      const [one, other] = [keys(a), keys(b)]
      const at = one.findIndex((key, i) => key !== other[i])
      return at < 0 ? 0 : (one[at] ?? 0) - (other[at] ?? 0)
    })
}

/** The suction catheters of a tube: the largest that is in stock and not too large, and the rule of thumb as a check. */
export interface TubeCatheters {
  readonly largestFr: number | undefined
  readonly quickRuleFr: number
  /** The rule of thumb would allow more than the limit: the limit counts. */
  readonly isQuickRuleTooLarge: boolean
}

/** Which suction catheters a tube takes, by the inside diameter with the inner cannula in. */
export function tubeCatheters(tube: ComparedTube, rule: CatheterRule): TubeCatheters {
  const idMm = breathedIdMm(tube)
  const quick = quickRuleFr(idMm)
  const most = idMm * 3 * rule.ratio
  return { largestFr: largestCatheter(idMm, rule), quickRuleFr: quick, isQuickRuleTooLarge: quick > most }
}
