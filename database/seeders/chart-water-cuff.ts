import { waterCuffs } from '#app/care/water-cuff/schema.ts'
import { type Bedside, tubeAt } from './bedside.ts'
import { type Draft, draft } from './draft.ts'
import { momentIn, shiftsOf } from './shifts.ts'

const PRESCRIBED_ML = 5

/** Water out and in, once in each shift, where the cuff holds water. A little is always lost. */
export function waterCuffCare(bedside: Bedside): readonly Draft[] {
  return shiftsOf(bedside)
    .flatMap(shift => momentIn(shift, bedside))
    .filter(at => tubeAt(bedside, at)?.tube.cuff === 'water')
    .map(at => {
      const removedMl = PRESCRIBED_ML - bedside.random.whole(0, 4) / 10
      return draft(waterCuffs, at, { prescribedMl: PRESCRIBED_ML, removedMl, instilledMl: PRESCRIBED_ML, leak: 'no' })
    })
}
