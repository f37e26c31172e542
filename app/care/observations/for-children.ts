import type { ForChildren } from '../children.ts'

const APLS =
  'Outer limits of normal by age as in advanced paediatric life support; to be confirmed by the paediatric lead'
const PALS = 'Low blood pressure by age as in paediatric advanced life support; to be confirmed by the paediatric lead'

type FourAges = readonly [neonate: number, infant: number, child: number, adolescent: number]

/** NEWS2 is for adults: children have limits by age, which no source read for this program gives, so they are from memory. */
function byAge(
  [neonate, infant, child, adolescent]: FourAges,
  min: number,
  max: number,
  says = APLS,
): ForChildren<number> {
  return { byAge: { neonate, infant, child, adolescent }, min, max, source: { says, standing: 'from memory' } }
}

export const rateLowForChildren = byAge([25, 20, 15, 10], 5, 40)
export const rateHighForChildren = byAge([60, 60, 40, 30], 20, 80)
export const heartLowForChildren = byAge([100, 90, 70, 50], 30, 130)
export const heartHighForChildren = byAge([180, 180, 150, 130], 100, 220)
export const systolicLowForChildren = byAge([60, 70, 80, 90], 40, 110, PALS)
export const systolicHighForChildren = byAge([100, 110, 130, 160], 90, 220, PALS)
