import type { TaskStatus } from '#app/rules/status.ts'
import { place, type Span, tenth } from './hour-ticks.ts'

export interface StripMark {
  readonly at: Date
  readonly shape: 'done' | 'out of range' | 'deferred'
  /** What it is, in words and with its time; asked of few, since a lane is said by its last. */
  says(): string
}
export interface StripWindow {
  readonly opensAt: Date
  readonly closesAt: Date
  readonly status: TaskStatus
  /** What is due, and how it stands, in words. */
  readonly says: string
}
export interface StripLane {
  readonly name: string
  readonly marks: readonly StripMark[]
  readonly windows: readonly StripWindow[]
}

/** Where the lanes lie. x runs over thousandths of the span, which are stretched to the width of the strip; y is in px. */
export interface LaneFrame {
  readonly span: Span
  readonly now: Date
  readonly top: number
  readonly laneHeight: number
}

/** A box of one lane. */
export interface Box {
  readonly x: number
  readonly y: number
  readonly width: number
  readonly height: number
}
export interface Point {
  readonly x: number
  readonly y: number
}
/** All that is drawn, gathered by look, so that a strip is a few elements whatever it holds. */
export interface LaneShapes {
  readonly outlines: Readonly<Record<Outline, string>>
  readonly done: string
  readonly late: readonly Box[]
  readonly seriousEdges: string
  readonly outOfRange: readonly Point[]
  readonly notes: readonly Point[]
}
type Outline = 'upcoming' | 'due soon' | 'due' | 'deferred' | 'suspended'

const BEYOND = 20 // thousandths: far enough over the edge for an outline to be cut open there
const LEAST = 9 // thousandths

export function laneShapes(lanes: readonly StripLane[], frame: LaneFrame): LaneShapes {
  const outlines: Record<Outline, string> = { upcoming: '', 'due soon': '', due: '', deferred: '', suspended: '' }
  let [done, seriousEdges] = ['', '']
  const late = new Map<number, Box>()
  const outOfRange: Point[] = []
  const notes: Point[] = []
  for (const [index, lane] of lanes.entries()) {
    const y = tenth(frame.top + (index + 0.5) * frame.laneHeight)
    for (const window of lane.windows) {
      const box = windowBox(window, y, frame)
      if (!box) continue
      if (window.status === 'overdue' || window.status === 'seriously overdue') {
        // Late care of one lane ends at now alike, so the longest bar covers the others.
        if (box.width > (late.get(box.y)?.width ?? 0)) late.set(box.y, box)
        if (window.status === 'seriously overdue') seriousEdges += `M${box.x} ${box.y}v${box.height}`
      } else {
        outlines[window.status] += boxPath(box)
        if (window.status === 'deferred') notes.push({ x: tenth(box.x + box.width / 2), y })
      }
    }
    for (const mark of lane.marks) {
      const x = place(mark.at, frame.span)
      if (x < 0 || x > 1000) continue
      if (mark.shape === 'done') done += `M${x} ${y}h0`
      else (mark.shape === 'deferred' ? notes : outOfRange).push({ x, y })
    }
  }
  return { outlines, done, late: [...late.values()], seriousEdges, outOfRange, notes }
}

/** A window as a box; a late one runs from its end to now, longer with every minute. Nothing when it lies outside the span. */
function windowBox(window: StripWindow, y: number, { span, now, laneHeight }: LaneFrame): Box | undefined {
  const isLate = window.status === 'overdue' || window.status === 'seriously overdue'
  const [from, to] = isLate ? [window.closesAt, now] : [window.opensAt, window.closesAt]
  const right = Math.min(place(to, span), isLate ? 1000 : 1000 + BEYOND)
  const left = Math.max(Math.min(place(from, span), right - LEAST), isLate ? 0 : -BEYOND)
  if (right <= 0 || left >= 1000) return undefined
  const height = Math.round(laneHeight * 0.6)
  return { x: tenth(left), y: tenth(y - height / 2), width: tenth(right - left), height }
}

const boxPath = ({ x, y, width, height }: Box): string => `M${x} ${y}h${width}v${height}h${-width}z`

/** What the strip shows, in words: what is due in each lane, what was out of range, how often and when care was last done. */
export function stripWords(title: string, lanes: readonly StripLane[]): string {
  return `${title}. ${lanes.map(laneWords).join(' ')}`
}

function laneWords({ name, marks, windows }: StripLane): string {
  const done = marks.filter(mark => mark.shape === 'done')
  const last = done.at(-1)
  const parts = [
    ...windows.map(window => window.says),
    ...marks.filter(mark => mark.shape !== 'done').map(mark => mark.says()),
    ...(last ? [done.length === 1 ? last.says() : `${done.length} done, last ${last.says()}`] : []),
  ]
  return `${name}: ${parts.length === 0 ? 'nothing' : parts.join('; ')}.`
}
