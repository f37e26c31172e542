import { type HumidificationData, humidifications } from '#app/care/humidification/schema.ts'
import { hmeInterval, waterInterval } from '#app/care/humidification/settings.ts'
import { type Bedside, inTime, pacedTimes } from './bedside.ts'
import { type Draft, draft } from './draft.ts'
import { leftOut, momentIn, shiftsOf } from './shifts.ts'
import type { BedStory } from './story.ts'

/** Looks at humidification: a change of exchanger or a look at the water where there is one, and one look in every other shift. */
export function humidificationCare(bedside: Bedside): readonly Draft[] {
  const { story } = bedside
  const method = methodOf(story)
  const every = method === 'hme' ? hmeInterval.default : method === 'heated' ? waterInterval.default : undefined
  const acts = every === undefined ? [] : pacedTimes(bedside, { every, pastDue: inTime(bedside, every) })
  const looks = shiftsOf(bedside)
    .slice(leftOut[story.stands.humidification ?? 'done'])
    .filter(shift => !acts.some(at => at >= shift.startsAt && at < shift.endsAt))
    .flatMap(shift => momentIn(shift, bedside))
  return [
    ...acts.map(at => draft(humidifications, at, lookOf(bedside, method, true))),
    ...looks.map(at => draft(humidifications, at, lookOf(bedside, method, false))),
  ]
}

/** What the prescribed oxygen or air goes through. */
function methodOf({ patient, secretions }: BedStory): 'hme' | 'heated' | 'cold aerosol' {
  if (patient.ventilated || secretions === 'thick') return 'heated'
  return patient.oxygen === null || patient.oxygen.includes('exchanger') ? 'hme' : 'cold aerosol'
}

function lookOf(
  { story, random }: Bedside,
  method: ReturnType<typeof methodOf>,
  isChange: boolean,
): HumidificationData {
  const seen = random.chance(0.5) ? { consistency: story.secretions } : {}
  if (method === 'hme') return { method, hmeChanged: isChange ? 'yes' : 'no', ...seen }
  if (method === 'cold aerosol') return { method, ...seen }
  return { method, waterLevel: random.pick(['ok', 'ok', 'filled']), temperature: random.pick([36.5, 37]), ...seen }
}
