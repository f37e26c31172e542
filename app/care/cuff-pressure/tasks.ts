import { hours, minutes } from '../../time/duration.ts'
import { type Clock, intervalClock, promptClock, sooner, suspended } from '../clock.ts'
import type { CareContext, TaskRule } from '../kind.ts'
import { isArrival, transfers } from '../transfer-checklist/schema.ts'
import { withoutTube } from '../tube-change/tasks.ts'
import { type TubeEntry, tubeInPlace } from '../tube-change/tube.ts'
import { type CuffEntry, cuffState, endsInBand, inflatedAt, isGauged } from './cuff.ts'
import { cuffChecks } from './schema.ts'
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
  const readings = record
    .since(cuffChecks, tube.performedAt)
    .filter(({ data }) => isGauged(data) && data.cuffNow !== 'deflated')
  const done = readings.find(({ data }) => endsInBand(data, values))
  const [read] = readings
  const clock =
    read && read !== done
      ? recheckClock(read, done, context)
      : intervalClock({ values, last: done, start: upSince(tube, record), interval: hours(values.of(cuffInterval)) })
  const asked = eventSince(read, tube, record)
  if (!asked) return clock
  return sooner(clock, promptClock({ values, ...asked, within: minutes(values.of(cuffEventCheck)), last: done }))
}

/** Since when the cuff has been up: a cuff let down and inflated again starts anew. */
function upSince(tube: TubeEntry, record: CareContext['record']): Date {
  return inflatedAt(record) ?? tube.performedAt
}

/** A reading left out of the band keeps the task open: measure again soon. A band set after it counts from then. */
function recheckClock(read: CuffEntry, done: CuffEntry | undefined, { values }: CareContext): Clock {
  const bandSet = [values.policy.startsAt, ...[cuffLower, cuffUpper].map(limit => values.personal(limit)?.since)]
  const moments = [read.performedAt, ...bandSet].map(moment => moment?.getTime() ?? 0)
  return promptClock({
    values,
    event: new Date(Math.max(...moments)),
    within: minutes(values.of(cuffRecheck)),
    last: done,
    because: 'the last reading was left out of the band',
  })
}

/** Inflation, tube change, arrival, turn or transfer with no reading by gauge since. */
function eventSince(read: CuffEntry | undefined, tube: TubeEntry, record: CareContext['record']) {
  const isUnread = (at: Date) => !read || read.performedAt < at
  const check = record.since(cuffChecks, tube.performedAt).find(({ data }) => eventWords(data) !== undefined)
  const because = check && eventWords(check.data)
  const inflated = inflatedAt(record)
  const moved = record.since(transfers, tube.performedAt).find(isArrival)
  const came = tube.data.reason === 'on arrival' ? 'the patient arrived with this tube' : 'the tube was changed'
  return [
    ...(check && because ? [{ event: check.performedAt, because }] : []),
    ...(inflated ? [{ event: inflated, because: 'the cuff was inflated' }] : []),
    ...(moved ? [{ event: moved.performedAt, because: 'the patient was moved' }] : []),
    { event: tube.performedAt, because: came },
  ]
    .filter(({ event }) => isUnread(event))
    .toSorted((a, b) => b.event.getTime() - a.event.getTime())[0]
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

export const cuffTasks: readonly TaskRule[] = [check]
