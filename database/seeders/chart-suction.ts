import { type SuctionData, suctions } from '#app/care/suction/schema.ts'
import { catheterShare, needInterval, stockedSizes, strictShare } from '#app/care/suction/settings.ts'
import { workingIdMm } from '#app/care/tube-change/tube.ts'
import { largestCatheter } from '#app/clinical/suction-catheter.ts'
import { type Bedside, pacedTimes, tubeAt } from './bedside.ts'
import { type Draft, draft } from './draft.ts'
import type { BedStory } from './story.ts'
import type { PrintedTube } from './tubes.ts'

/** Looks at the need for suction, about half of which end in suction. */
export function suctionCare(bedside: Bedside): readonly Draft[] {
  const { story, random } = bedside
  if (story.stands.suction === undefined) return []
  const times = pacedTimes(bedside, { every: needInterval.default, pastDue: story.stands.suction })
  return times.flatMap(at => {
    const tube = tubeAt(bedside, at)?.tube
    if (!tube) return []
    const data = random.chance(needed[story.secretions]) ? episode(bedside, tube) : ({ act: 'need only' } as const)
    return [draft(suctions, at, data, random.chance(0.12) ? { by: 'respiratory therapist' } : {})]
  })
}

const needed: Readonly<Record<BedStory['secretions'], number>> = { thin: 0.35, moderate: 0.55, thick: 0.75 }

/** An episode of suction as it goes on most days, with the largest catheter that the tube takes. */
export function episode({ story, random }: Bedside, tube: PrintedTube, more: Partial<SuctionData> = {}): SuctionData {
  return {
    act: 'episode',
    indication: random.pick([
      ['secretions'],
      ['secretions'],
      ['coarse sounds'],
      ['asked'],
      ['secretions', 'coarse sounds'],
    ]),
    route: story.patient.ventilated ? 'tube closed' : 'tube open',
    catheter: catheterFor(tube),
    vacuum: random.pick([100, 110, 120, 120, 130]),
    vacuumUnit: 'mmHg',
    passes: random.pick([1, 1, 2, 2, 3]),
    passed: 'easily',
    longestPassS: random.whole(6, 10),
    ...(tube.fenestrated === 'yes' ? { innerCannula: 'plain' as const } : {}),
    ...secretions(story.secretions, random),
    blood: 'none',
    tolerance: random.pick(['well', 'well', 'cough']),
    ...(random.chance(0.3) ? { spo2Low: random.whole(93, 96) } : {}),
    ...more,
  }
}

function secretions(usual: BedStory['secretions'], random: Bedside['random']) {
  if (usual === 'thin') {
    return { amount: random.pick(['scant', 'small']), colour: 'clear', consistency: 'thin' } as const
  }
  if (usual === 'moderate') {
    return {
      amount: random.pick(['small', 'moderate']),
      colour: random.pick(['clear', 'tan']),
      consistency: 'moderate',
    } as const
  }
  return { amount: 'moderate', colour: random.pick(['tan', 'yellow']), consistency: 'thick' } as const
}

function catheterFor(tube: PrintedTube): NonNullable<SuctionData['catheter']> {
  const rule = {
    stockedFr: stockedSizes.default,
    ratio: catheterShare.default / 100,
    strict: strictShare.default,
  }
  const fr = largestCatheter(workingIdMm(tube), rule)
  const found = catheters.find(name => name === `${fr} Fr`)
  if (!found) throw new RangeError(`No catheter fits a ${tube.line} ${tube.size}`)
  return found
}

const catheters = ['5 Fr', '6 Fr', '8 Fr', '10 Fr', '12 Fr', '14 Fr', '16 Fr', '18 Fr'] as const
