import { hours, minutes } from '../../time/duration.ts'
import { type Clock, intervalClock, promptClock, sooner, suspended } from '../clock.ts'
import type { CareContext, TaskRule } from '../kind.ts'
import { withoutTube } from '../tube-change/tasks.ts'
import { type TubeEntry, tubeInPlace } from '../tube-change/tube.ts'
import { type CuffEntry, cuffState, endsInBand, isGauged, isLeftInBand } from './cuff.ts'
import { cuffChecks, leftCmH2O } from './schema.ts'
import { cuffEventCheck, cuffInterval, cuffLower, cuffRecheck, cuffUpper } from './settings.ts'

const still: Readonly<Record<string, string>> = {
  'no cuff': 'tube without a cuff',
  foam: 'foam cuff: no air is added',
  water: 'water cuff: measured in mL, not cmH2O',
  deflated: 'cuff is down',
}

const check: TaskRule = {
  name: 'cuff-pressure-check',
  airway: true,
  settings: [cuffInterval, cuffLower, cuffUpper, cuffEventCheck, cuffRecheck],
  says: ({ values }) =>
    `Every ${values.of(cuffInterval)} hours, ${values.of(cuffLower)} to ${values.of(cuffUpper)} cmH2O; within ${values.of(cuffEventCheck)} minutes of inflation, tube change, arrival, turn or transfer, and ${values.of(cuffRecheck)} minutes of a reading left out of that. Only a gauge reading left in the band counts.`,
  clock(context) {
    const tube = tubeInPlace(context.record)
    if (!tube) return withoutTube(context)
    const state = cuffState(context.record)
    return still[state] ? suspended(still[state]) : cuffClock(tube, context)
  },
}

function cuffClock(tube: TubeEntry, context: CareContext): Clock {
  const { record, values } = context
  const done = record.latest(
    cuffChecks,
    (data, entry) => endsInBand(data, values) && entry.performedAt >= tube.performedAt,
  )
  const regular = intervalClock({
    last: done,
    start: upSince(tube, record),
    interval: hours(values.of(cuffInterval)),
  })
  return [afterEvent(tube, done, context), afterBadReading(done, context)].reduce<Clock>(
    (clock, prompt) => (prompt ? sooner(clock, prompt) : clock),
    regular,
  )
}

/** Since when the cuff has been up: a cuff let down and inflated again starts anew. */
function upSince(tube: TubeEntry, record: CareContext['record']): Date {
  const inflation = record.latest(cuffChecks, data => data.cuffNow === 'inflated')
  return inflation && inflation.performedAt > tube.performedAt ? inflation.performedAt : tube.performedAt
}

/** Inflation, tube change, arrival, turn or transfer with no good reading since. */
function afterEvent(tube: TubeEntry, done: CuffEntry | undefined, { record, values }: CareContext): Clock | undefined {
  const within = minutes(values.of(cuffEventCheck))
  const event = record.latest(cuffChecks, data => eventWords(data) !== undefined)
  const because = event && eventWords(event.data)
  if (event && because && event.performedAt >= tube.performedAt && !(done && done.performedAt >= event.performedAt)) {
    return promptClock({ event: event.performedAt, within, last: done, because })
  }
  if (done) return undefined
  const came = tube.data.reason === 'on arrival' ? 'the patient arrived with this tube' : 'the tube was changed'
  return promptClock({ event: tube.performedAt, within, last: done, because: came })
}

/** What was charted in place of a reading by gauge, and asks for one. */
function eventWords(data: CuffEntry['data']): string | undefined {
  if (isGauged(data)) return undefined
  if (data.method !== 'not measured') return 'the cuff was set without a gauge'
  if (data.cuffNow === 'inflated' || data.reason === 'inflation') return 'the cuff was inflated'
  if (data.airMl !== undefined && data.airMl !== 0) return `air was ${data.airMl > 0 ? 'added' : 'removed'}`
  if (data.reason === 'turned') return 'the patient was turned'
  if (data.reason === 'transfer') return 'the patient was moved'
  return data.reason === 'leak' || data.leak === 'yes' ? 'a leak was heard' : undefined
}

/** A reading left out of the band keeps the task open: measure again soon. */
function afterBadReading(done: CuffEntry | undefined, { record, values }: CareContext): Clock | undefined {
  const last = record.latest(cuffChecks, data => leftCmH2O(data) !== undefined && data.cuffNow !== 'deflated')
  if (!last || isLeftInBand(last.data, values) || (done && done.performedAt >= last.performedAt)) return undefined
  const tube = tubeInPlace(record)
  if (!tube || last.performedAt < tube.performedAt) return undefined
  return promptClock({
    event: last.performedAt,
    within: minutes(values.of(cuffRecheck)),
    last: done,
    because: 'the last reading was left out of the band',
  })
}

export const cuffTasks: readonly TaskRule[] = [check]
