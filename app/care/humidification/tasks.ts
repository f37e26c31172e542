import { hours } from '../../time/duration.ts'
import { type Clock, intervalClock, noClock, shiftClock, suspended } from '../clock.ts'
import type { CareContext, TaskRule } from '../kind.ts'
import type { Setting } from '../policy.ts'
import { isLaryngectomy } from '../stoma-and-skin/tasks.ts'
import { withoutTube } from '../tube-change/tasks.ts'
import { tubeInPlace } from '../tube-change/tube.ts'
import { careFrom, currentRun } from './runs.ts'
import { type HumidificationData, humidifications } from './schema.ts'
import { hmeInterval, waterInterval } from './settings.ts'

const check: TaskRule = {
  name: 'humidification-check',
  airway: false,
  settings: [],
  says: () => 'Once in each shift: what warms and moistens the air, and how the secretions are.',
  clock(context) {
    if (!breathesThroughOpening(context)) return withoutTube(context)
    const last = context.record.latest(humidifications)
    return shiftClock({ values: context.values, last, start: careFrom(context), ward: context.ward })
  },
}

const hmeChange: TaskRule = {
  name: 'hme-change',
  airway: false,
  settings: [hmeInterval],
  opensWith: { method: 'hme', hmeChanged: 'yes' },
  says: ({ values }) =>
    `A heat and moisture exchanger is changed every ${values.of(hmeInterval)} h, and whenever it is wet or soiled. It stands still on a heated humidifier.`,
  clock(context) {
    if (currentRun(context)[0]?.data.method === 'heated') return suspended('heated humidifier in use')
    return runClock(context, { method: 'hme', interval: hmeInterval, counts: data => data.hmeChanged === 'yes' })
  },
}

const waterCheck: TaskRule = {
  name: 'heated-water-check',
  airway: false,
  settings: [waterInterval],
  opensWith: { method: 'heated' },
  says: ({ values }) =>
    `The water of a heated humidifier is looked at every ${values.of(waterInterval)} h. A level left low does not count.`,
  clock: context =>
    runClock(context, { method: 'heated', interval: waterInterval, counts: data => data.waterLevel !== 'low' }),
}

interface RunRule {
  readonly method: HumidificationData['method']
  readonly interval: Setting<number>
  readonly counts: (data: HumidificationData) => boolean
}

/** A clock that runs only while one method is in use, from the act that put it on. */
function runClock(context: CareContext, { method, interval, counts }: RunRule): Clock {
  if (!breathesThroughOpening(context)) return withoutTube(context)
  const run = currentRun(context)
  const start = run.at(-1)
  if (!start || start.data.method !== method) return noClock
  const last = run.find(({ data }) => counts(data))
  return intervalClock({
    values: context.values,
    last,
    start: start.performedAt,
    interval: hours(context.values.of(interval)),
  })
}

function breathesThroughOpening(context: CareContext): boolean {
  return tubeInPlace(context.record) !== undefined || isLaryngectomy(context)
}

export const humidificationTasks: readonly TaskRule[] = [check, hmeChange, waterCheck]
