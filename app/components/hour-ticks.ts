import { showDay } from '#app/time/display.ts'
import { daysBetween, localDay, localTime, offsetMinutes, type Zone } from '#app/time/zone.ts'

export interface Span {
  readonly from: Date
  readonly to: Date
}

/** A vertical line of the grid: where it stands, in thousandths of the span, and what the wall clock says there. */
export interface Tick {
  readonly x: number
  readonly label: string
}

const HOUR = 3_600_000 // ms
const MINUTE = 60_000 // ms
const HOUR_STEPS = [1, 2, 3, 4, 6, 12]
const DAY_STEPS = [1, 2, 7]
const LABEL_PX = 36
const GAP_PX = 18
const FLAG_PX = 46
/** Days are counted from here, so that the same days carry a label however far a span has moved on. */
const SOME_DAY = '2026-01-05'
/** Beyond this the axis counts days. */
const HOURS_AT_MOST = 48

/** Thousandths of the span from its start, rounded to a tenth. */
export function place(at: Date, { from, to }: Span): number {
  return tenth((1000 * (at.getTime() - from.getTime())) / (to.getTime() - from.getTime()))
}

/** Thousandths as a percentage, for attributes that are not stretched with the strip. */
export const percent = (x: number): string => `${Math.round(x) / 10}%`

export const tenth = (n: number): number => Math.round(n * 10) / 10

/** The grid of a span drawn `width` px wide: as fine as its labels allow, at full hours of the ward's wall clock, or at midnights. */
export function gridTicks(span: Span, zone: Zone, width: number): readonly Tick[] {
  const hours = (span.to.getTime() - span.from.getTime()) / HOUR
  const room = width / hours // px an hour
  const needed = LABEL_PX + GAP_PX
  const byDay = hours > HOURS_AT_MOST
  const step = byDay
    ? 24 * (DAY_STEPS.find(days => days * 24 * room >= needed) ?? 7)
    : (HOUR_STEPS.find(count => count * room >= needed) ?? 12)
  return wallHours(span, zone)
    .filter(at => isOnStep(at, zone, step))
    .map(at => ({ x: place(at, span), label: byDay ? dayLabel(at, zone) : localTime(at, zone) }))
}

/** Which ticks can carry a label at a width, left to right: clear of both ends, of each other and of the flag at `now`. */
export function labelled(ticks: readonly Tick[], width: number, nowX: number): readonly Tick[] {
  const px = (x: number) => (x * width) / 1000
  const shown: Tick[] = []
  for (const tick of ticks) {
    const at = px(tick.x)
    const last = shown.at(-1)
    const clearOfEnds = at >= LABEL_PX / 2 && at <= width - LABEL_PX / 2
    const clearOfFlag = Math.abs(at - px(nowX)) >= (LABEL_PX + FLAG_PX) / 2 + 4
    const clearOfLast = !last || at - px(last.x) >= LABEL_PX + GAP_PX / 2
    if (clearOfEnds && clearOfFlag && clearOfLast) shown.push(tick)
  }
  return shown
}

/** Every instant of a span at which the wall clock shows a full hour; an hour that clocks repeat comes twice. */
function wallHours(span: Span, zone: Zone): readonly Date[] {
  const found: Date[] = []
  for (let at = nextHour(span.from.getTime() - 1, zone); at <= span.to.getTime(); at = nextHour(at, zone)) {
    found.push(new Date(at))
  }
  return found
}

/** Offsets of zones are not always whole hours, and change: the next full hour is asked of the wall clock each time. */
function nextHour(ms: number, zone: Zone): number {
  const offset = offsetMinutes(new Date(ms), zone) * MINUTE
  return (Math.floor((ms + offset) / HOUR) + 1) * HOUR - offset
}

function isOnStep(at: Date, zone: Zone, step: number): boolean {
  const hour = Number(localTime(at, zone).slice(0, 2))
  if (step <= 24) return hour % step === 0
  return hour === 0 && daysBetween(SOME_DAY, localDay(at, zone)) % (step / 24) === 0
}

function dayLabel(at: Date, zone: Zone): string {
  return showDay(localDay(at, zone)).slice(0, 6)
}
