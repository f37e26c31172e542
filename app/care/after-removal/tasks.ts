import { type Duration, hours, later, minutes, since } from '../../time/duration.ts'
import { noClock, windowAround } from '../clock.ts'
import type { TaskRule } from '../kind.ts'
import type { Values } from '../policy.ts'
import { tubeOutSince } from '../tube-change/tube-absence.ts'
import { afterRemovals } from './schema.ts'
import { afterRemovalInterval, afterRemovalPeriod, afterRemovalSchedule } from './settings.ts'

/** A moment of the schedule, counted from the removal, and how long after the one before it. */
interface Step {
  readonly after: Duration
  readonly gap: Duration
}

/** Observations after removal, often at first: they take the place of the care of the tube. */
const observations: TaskRule = {
  name: 'observations-after-removal',
  airway: true,
  settings: [afterRemovalSchedule, afterRemovalInterval, afterRemovalPeriod],
  says: ({ values }) =>
    `At ${values.of(afterRemovalSchedule).join(', ')} minutes after the tube came out, then every ${values.of(afterRemovalInterval)} hours until ${values.of(afterRemovalPeriod)} hours have passed.`,
  clock({ record, values, now }) {
    const out = tubeOutSince(record)
    // A laryngectomy without its tube breathes as before.
    if (!out || record.patient.upperAirway === 'not open') return noClock
    if (now > later(out, hours(values.of(afterRemovalPeriod) + 1))) return noClock
    const [last] = record.since(afterRemovals, out)
    const step = nextStep(last ? since(out, last.performedAt) : undefined, values)
    if (!step) return noClock
    return {
      state: 'running',
      window: windowAround(later(out, step.after), step.gap, values),
      last,
      from: last?.performedAt ?? out,
    }
  },
}

/** The first step that the last set does not answer; a set up to a quarter of the gap early answers its step. */
function nextStep(done: Duration | undefined, values: Values): Step | undefined {
  return schedule(values).find(({ after, gap }) => done === undefined || done < after - gap / 4)
}

function schedule(values: Values): readonly Step[] {
  const every = hours(values.of(afterRemovalInterval))
  const end = hours(values.of(afterRemovalPeriod))
  const moments = values
    .of(afterRemovalSchedule)
    .toSorted((a, b) => a - b)
    .map(minutes)
    .filter(after => after <= end)
  for (let after = (moments.at(-1) ?? 0) + every; after <= end; after += every) moments.push(after as Duration)
  return moments.map((after, index) => ({ after, gap: (after - (moments[index - 1] ?? 0)) as Duration }))
}

export const afterRemovalTasks: readonly TaskRule[] = [observations]
