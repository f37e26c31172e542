import { type OralCareData, oralCares } from '#app/care/oral-care/schema.ts'
import { brushingInterval, oralCareInterval } from '#app/care/oral-care/settings.ts'
import { hours, since } from '#app/time/duration.ts'
import { type Bedside, inTime, pacedTimes, tubeAt } from './bedside.ts'
import { type Draft, draft } from './draft.ts'

/** Care of the mouth every few hours, with the teeth brushed twice a day. A brushing is a round as well. */
export function oralCare(bedside: Bedside): readonly Draft[] {
  const { stands } = bedside.story
  const every = oralCareInterval.default
  const brushings = pacedTimes(bedside, {
    every: brushingInterval.default,
    pastDue: inTime(bedside, brushingInterval.default),
  })
  const rounds = pacedTimes(bedside, { every, pastDue: stands.oralCare ?? inTime(bedside, every) })
  const apart = rounds.filter((at, index) => index === 0 || !brushings.some(other => isNear(at, other)))
  return [...apart.map(at => ({ at, brushes: false })), ...brushings.map(at => ({ at, brushes: true }))]
    .filter(({ at }) => tubeAt(bedside, at) !== undefined)
    .map(({ at, brushes }) => draft(oralCares, at, roundOf(bedside, brushes)))
}

const isNear = (a: Date, b: Date): boolean => Math.abs(since(a, b)) < hours(1)

function roundOf({ random }: Bedside, brushes: boolean): OralCareData {
  const care: OralCareData['care'] = brushes ? ['looked', 'moistened', 'brushed'] : ['looked', 'moistened']
  return { care, seen: [random.pick(['clean', 'clean', 'clean', 'dry', 'coated'])] }
}
