import { type ObservationData, observationSets } from '#app/care/observations/schema.ts'
import { observationInterval } from '#app/care/observations/settings.ts'
import { type Bedside, inTime, pacedTimes, tubeAt } from './bedside.ts'
import { type Draft, draft } from './draft.ts'
import type { BedStory } from './story.ts'

/** Observations every few hours, with nothing out of the ordinary. */
export function observationCare(bedside: Bedside): readonly Draft[] {
  const every = observationInterval.default
  const pastDue = bedside.story.stands.observations ?? inTime(bedside, every)
  return pacedTimes(bedside, { every, pastDue })
    .filter(at => tubeAt(bedside, at) !== undefined)
    .map(at => draft(observationSets, at, calmSet(bedside)))
}

/** A set within what is prescribed and usual. SpO2 stays within two points, since a fall of three is told of. */
export function calmSet({ story, random }: Bedside): ObservationData {
  const lowest = story.patient.spo2Low ?? 94
  return {
    respiratoryRate: random.whole(13, 20),
    spo2: random.whole(lowest + 1, lowest + 3),
    ...oxygenOf(story.patient),
    effort: 'easy',
    heartRate: random.whole(66, 98),
    awareness: story.patient.ventilated ? 'sedated' : 'alert',
    redFlags: ['none'],
    ...(random.chance(0.4) ? { temperature: random.whole(363, 374) / 10 } : {}),
  }
}

/** As prescribed: `Oxygen 28% by tracheostomy mask`, or air. */
function oxygenOf({ ventilated, oxygen }: BedStory['patient']): Pick<ObservationData, 'oxygen' | 'fio2'> {
  const share = Number(oxygen?.match(/(\d+)%/)?.[1])
  if (!share) return { oxygen: 'air' }
  return { oxygen: ventilated ? 'ventilator' : 'stoma mask', fio2: share }
}
