import { type AfterRemovalData, afterRemovals } from '#app/care/after-removal/schema.ts'
import { afterRemovalInterval, afterRemovalPeriod, afterRemovalSchedule } from '#app/care/after-removal/settings.ts'
import { readinessChecks } from '#app/care/decannulation-readiness/schema.ts'
import { hours, later, minutes } from '#app/time/duration.ts'
import { type Bedside, hoursBefore } from './bedside.ts'
import { trialFrom } from './chart-weaning.ts'
import { type Draft, draft } from './draft.ts'

/** What goes before and after a removal for good: a cap borne for a day, readiness, and close observation afterwards. */
export function removalCare(bedside: Bedside): readonly Draft[] {
  const { story, until } = bedside
  if (story.removedHoursAgo === undefined) return []
  return [
    ...trialFrom('cap', [hoursBefore(until, 26), hoursBefore(until, 1.2)]),
    draft(readinessChecks, hoursBefore(until, 0.9), allReady, { by: 'tracheostomy specialist' }),
    ...setsAfter(bedside),
  ]
}

const allReady = {
  cause: 'yes',
  airway: 'yes',
  commands: 'yes',
  cuffDown: 'yes',
  secretions: 'yes',
  cough: 'yes',
  swallow: 'yes',
  heart: 'yes',
  chest: 'yes',
  team: 'yes',
} as const

/** Each set a minute or two after its moment, for as long as the patient was watched. */
function setsAfter(bedside: Bedside): readonly Draft[] {
  const { until: removedAt, story, now, random } = bedside
  const left = story.discharged ? hoursBefore(now, story.discharged.hoursAgo) : now
  const moments = [...afterRemovalSchedule.default]
  const every = afterRemovalInterval.default * 60
  for (let at = (moments.at(-1) ?? 0) + every; at <= afterRemovalPeriod.default * 60; at += every) moments.push(at)
  return moments
    .map(after => later(removedAt, minutes(after + random.whole(0, 2))))
    .filter(at => at < later(left, hours(-0.1)))
    .map(at => draft(afterRemovals, at, quietSet(bedside)))
}

function quietSet({ story, random }: Bedside): AfterRemovalData {
  const lowest = story.patient.spo2Low ?? 94
  return {
    respiratoryRate: random.whole(14, 19),
    spo2: random.whole(lowest + 1, lowest + 3),
    effort: 'easy',
    stridor: 'no',
    voice: random.chance(0.3) ? 'hoarse' : 'clear',
    monitored: 'yes',
    spareThere: 'yes',
  }
}
