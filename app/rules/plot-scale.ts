import { type Duration, days, hours, minutes } from '../time/duration.ts'

/** Lowest and highest value of an axis. */
export interface Scale {
  readonly from: number
  readonly to: number
}

/**
 * Round numbers that label an axis from `from` to `to`: multiples of 1, 2 or 5 of a power of ten, about `count` of them, the first
 * and the last at or beyond the ends (Heckbert, "Nice numbers for graph labels", Graphics Gems, 1990).
 * Throws RangeError unless `to` lies above `from`.
 */
export function niceTicks({ from, to }: Scale, count = 5): readonly number[] {
  if (!(to > from)) throw new RangeError(`No axis from ${from} to ${to}`)
  const step = roundedNumber(nextNumber(to - from) / (count - 1))
  const first = Math.floor(from / step + NOISE)
  const last = Math.ceil(to / step - NOISE)
  // Multiplied anew each time and cut to the digits of the step: 3 times 0.1 is 0.3.
  const digits = Math.max(0, -Math.floor(Math.log10(step)))
  return Array.from({ length: last - first + 1 }, (_, index) => Number(((first + index) * step).toFixed(digits)))
}

const NOISE = 1e-9

/** The nice number at or above. */
const nextNumber = (n: number): number =>
  niceNumber(n, share => (share <= 1 ? 1 : share <= 2 ? 2 : share <= 5 ? 5 : 10))

/** The nice number that is near. */
const roundedNumber = (n: number): number =>
  niceNumber(n, share => (share < 1.5 ? 1 : share < 3 ? 2 : share < 7 ? 5 : 10))

function niceNumber(n: number, nice: (share: number) => number): number {
  const power = 10 ** Math.floor(Math.log10(n))
  return power * nice(n / power)
}

const steps: readonly Duration[] = [
  ...[5, 10, 15, 30].map(minutes),
  ...[1, 2, 3, 6, 12].map(hours),
  ...[1, 2, 7].map(days),
]

/** Lengths that label an axis from nothing to `to`, in steps of a clock: `0, 6 h, 12 h`. The last is at or beyond it; at most eight. */
export function durationTicks(to: Duration): readonly Duration[] {
  const most = 6
  const step = steps.find(one => one * most >= to) ?? ((Math.ceil(to / most / days(7)) * days(7)) as Duration)
  const count = Math.max(1, Math.ceil(to / step))
  return Array.from({ length: count + 1 }, (_, index) => (index * step) as Duration)
}

/** Where a value lies on an axis: thousandths from its low end, to a tenth. Beyond an end it is held there, and that is said. */
export interface Placed {
  readonly at: number
  readonly beyond?: 'below' | 'above'
}

/** The place of a value on a scale. */
export function placed(value: number, { from, to }: Scale): Placed {
  if (value < from) return { at: 0, beyond: 'below' }
  if (value > to) return { at: 1000, beyond: 'above' }
  return { at: Math.round((10_000 * (value - from)) / (to - from)) / 10 }
}
