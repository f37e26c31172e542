import { type CuffData, cuffChecks } from '#app/care/cuff-pressure/schema.ts'
import { cuffInterval } from '#app/care/cuff-pressure/settings.ts'
import { fromCmH2O } from '#app/clinical/units.ts'
import { type Bedside, pacedTimes, placeAt, tubeAt } from './bedside.ts'
import { type Draft, draft } from './draft.ts'

/** Cuff pressures of the stay: mostly in the band, some found outside it and put right. Only where the cuff holds air. */
export function cuffCare(bedside: Bedside): readonly Draft[] {
  const { story, random } = bedside
  const { cuff: pastDue, cuffFound, cuffEvery = cuffInterval.default } = story.stands
  if (pastDue === undefined) return []
  const times = pacedTimes(bedside, { every: cuffEvery, pastDue }).filter(
    at => tubeAt(bedside, at)?.tube.cuff === 'air',
  )
  return times.map((at, index) => {
    const found = index === 0 ? cuffFound : usualFinding(bedside, index)
    const data = found ? putRight(bedside, at, found) : settledReading(bedside, at)
    return draft(cuffChecks, at, data, random.chance(0.3) ? { by: 'respiratory therapist' } : {})
  })
}

/** About one in ten is found outside the band. Low ones stay rare and apart: two top-ups in twelve hours ask for a review. */
function usualFinding({ random }: Bedside, index: number): 'high' | 'low' | undefined {
  if (random.chance(0.09)) return 'high'
  return index % 5 === 4 && random.chance(0.2) ? 'low' : undefined
}

/** A reading within the band that was left as it was. */
export function settledReading(bedside: Bedside, at: Date): CuffData {
  const { random, band } = bedside
  const position = random.pick(['head up', 'head up', 'side', 'sitting', 'flat'])
  return foundBy(bedside, at, random.whole(band.lower + 2, band.upper - 1), { position })
}

/** A reading by manometer, found at a pressure in cmH2O, and left at another one where that is given. */
export function foundBy(
  bedside: Bedside,
  at: Date,
  foundCmH2O: number,
  more: Partial<CuffData>,
  leftCmH2O?: number,
): CuffData {
  const unit = placeAt(bedside, at).ward.row.pressureUnit
  const shown = (cmH2O: number) => Math.round(fromCmH2O(cmH2O, unit))
  const left = leftCmH2O === undefined ? {} : { leftAt: shown(leftCmH2O) }
  return { found: shown(foundCmH2O), unit, ...left, method: 'manometer', ...more }
}

function putRight(bedside: Bedside, at: Date, found: 'high' | 'low'): CuffData {
  const { random, band } = bedside
  const left = random.whole(band.lower + 2, band.upper - 1)
  const position = random.pick(['head up', 'side'])
  if (found === 'low') return foundBy(bedside, at, band.lower - random.whole(2, 4), { position, leak: 'no' }, left)
  const airMl = -random.pick([0.5, 1, 1.5])
  return foundBy(bedside, at, band.upper + random.whole(3, 8), { position, reason: 'turned', airMl }, left)
}
