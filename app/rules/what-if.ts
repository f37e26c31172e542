import { carePlans } from '../care/care-plan/schema.ts'
import type { CareContext, PatientRecord, WardFacts } from '../care/kind.ts'
import { wordsOf } from '../care/kind.ts'
import { careTasks, type KindTask } from '../care/kinds.ts'
import type { Policy } from '../care/policy.ts'
import { nextShift, type Shift, shiftAt } from '../time/shift.ts'
import { careContext } from './context.ts'
import { isTooYoung } from './due-tasks.ts'
import { countUntil, type RecordOverTime, recordOverTime } from './record-over-time.ts'
import { type Found, taskWalk } from './task-walk.ts'

/** A stay on the ward: its record, and when it was here (`until`: the end of the stay, or of the time looked at). */
export interface StayOnWard {
  readonly record: PatientRecord
  readonly from: Date
  readonly until: Date
}

export interface Load {
  readonly tasks: number
  readonly late: number
}

/** What a policy would have asked for: in all, by the shifts of a day, and by task. */
export interface WardLoad {
  readonly total: Load
  readonly byShift: ReadonlyMap<string, Load>
  readonly byTask: ReadonlyMap<string, Load>
  /** Patients that nothing is computed for, as there is no rule set for children. */
  readonly withoutRules: number
  /** Clocks that were read: the work done. */
  readonly clocksRead: number
}

interface Asked {
  readonly stays: readonly StayOnWard[]
  readonly policy: Policy
  readonly ward: WardFacts
  readonly from: Date
  readonly to: Date
  readonly tasks?: readonly KindTask[]
}

/**
 * How many tasks a policy would have made due between two moments, and how many of them the care that was charted would have met
 * late. Pure. Clocks are read again only when an entry that they asked for comes; those that asked for the time are also read at the
 * start of each shift: of what follows from time alone, a change may be seen up to a shift late.
 */
export function wardLoad({ stays, policy, ward, from, to, tasks = careTasks }: Asked): WardLoad {
  const roster = rosterOf(ward, from, to)
  const tally = newTally(ward, roster)
  let withoutRules = 0
  for (const stay of stays) {
    const span = {
      from: Math.max(from.getTime(), stay.from.getTime()),
      to: Math.min(to.getTime(), stay.until.getTime()),
    }
    const asking = askerOf(recordOverTime(stay.record), { policy, ward, roster })
    if (asking.at(span.to).isOutside) withoutRules += 1
    else for (const { rule } of tasks) walk(rule, span, asking, one => tally.add(rule.name, one))
  }
  return { ...tally.sums(), withoutRules, clocksRead: tally.read() }

  function walk(
    rule: KindTask['rule'],
    span: { from: number; to: number },
    asking: Asker,
    found: (one: Found) => void,
  ) {
    const steps = taskWalk(rule, span, found)
    asking.over.forget()
    for (let at = span.from; at < span.to; ) {
      const { context, isOutside, mayAge } = asking.at(at)
      const watched = watchingTime(context)
      const clock = isOutside ? ({ state: 'none' } as const) : rule.clock(watched.context)
      tally.noteRead()
      const byTime = mayAge || watched.wasAsked() ? roster.at(at).endsAt.getTime() : Number.POSITIVE_INFINITY
      const next = Math.min(asking.over.nextChange(at), byTime, span.to)
      steps.step(clock, context, next)
      at = next
    }
    steps.end()
  }
}

/** A context that notes whether it is asked for the time: what does not ask cannot change with it. */
function watchingTime(context: CareContext) {
  let asked = false
  const { record, values, ward, now } = context
  const watching: CareContext = {
    ...{ record, values, ward },
    get now() {
      asked = true
      return now
    },
  }
  return { context: watching, wasAsked: () => asked }
}

interface Asker {
  readonly over: RecordOverTime
  at(ms: number): Judged & { readonly context: CareContext }
}

interface Judged {
  readonly values: CareContext['values']
  readonly isOutside: boolean
  /** Whether other numbers may count for this person with age; those for adults do for good. */
  readonly mayAge: boolean
}

/** Contexts of one patient at any moment. Own values and age change with the care plan and with time, so those are kept by plan and shift. */
function askerOf(
  over: RecordOverTime,
  { policy, ward, roster }: { readonly policy: Policy; readonly ward: WardFacts; readonly roster: Roster },
): Asker {
  const kept = new Map<Shift, Map<number, Judged>>()
  return {
    over,
    at(ms) {
      const now = new Date(ms)
      const record = over.at(now)
      const judged = known(roster.at(ms), record, now)
      return { ...judged, context: { record, values: judged.values, ward, now } }
    },
  }

  function known(shift: Shift, record: PatientRecord, now: Date): Judged {
    const ofShift = kept.get(shift) ?? new Map<number, Judged>()
    const plans = record.of(carePlans).length
    const judged = ofShift.get(plans) ?? judge(record, now)
    kept.set(shift, ofShift.set(plans, judged))
    return judged
  }

  function judge(record: PatientRecord, now: Date): Judged {
    const context = careContext({ record, policy, ward, now })
    const { values } = context
    const isOutside = isTooYoung(context)
    return { values, isOutside, mayAge: isOutside || values.policy.ruleSet === 'children' }
  }
}

/** The shifts of a ward, looked up without asking the calendar again. */
interface Roster {
  at(ms: number): Shift
}

function rosterOf({ shiftTimes, zone }: WardFacts, from: Date, to: Date): Roster {
  const shifts = [shiftAt(from, shiftTimes, zone)]
  for (let last = shifts[0]; last && last.endsAt <= to; shifts.push(last)) last = nextShift(last, shiftTimes, zone)
  const starts = shifts.map(shift => shift.startsAt.getTime())
  return { at: ms => shifts[countUntil(starts, ms) - 1] ?? shiftAt(new Date(ms), shiftTimes, zone) }
}

function newTally(ward: WardFacts, roster: Roster) {
  const byShift = new Map(ward.shiftTimes.map(time => [`Shift from ${time}`, { tasks: 0, late: 0 }]))
  const byTask = new Map<string, { tasks: number; late: number }>()
  const total = { tasks: 0, late: 0 }
  let read = 0
  return {
    noteRead: () => {
      read += 1
    },
    read: () => read,
    add(name: string, { what, at }: Found) {
      const count = what === 'task' ? 'tasks' : 'late'
      const task = byTask.get(wordsOf(name)) ?? { tasks: 0, late: 0 }
      byTask.set(wordsOf(name), task)
      const shift = byShift.get(roster.at(at).label)
      for (const load of [total, task, shift]) if (load) load[count] += 1
    },
    sums: () => ({ total, byShift, byTask }),
  }
}
