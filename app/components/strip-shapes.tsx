import type { ReactNode } from 'react'
import { percent, type Tick } from './hour-ticks.ts'
import type { LaneShapes } from './strip-lanes.ts'
import { HATCH, NOTE, TRIANGLE } from './strip-patterns.tsx'

interface StretchedProps {
  readonly height: number
  readonly children: ReactNode
}

/** A space 1000 wide that is stretched to the strip. Lines in it keep their thickness, so a line of no length is a round dot. */
export function Stretched({ height, children }: StretchedProps) {
  return (
    <svg aria-hidden="true" viewBox={`0 0 1000 ${height}`} width="100%" height={height} preserveAspectRatio="none">
      {children}
    </svg>
  )
}

interface StripGridProps {
  readonly ticks: readonly Tick[]
  readonly rows: number
  readonly top: number
  readonly laneHeight: number
}

/** The hours and the lanes of one strip. */
export function StripGrid(grid: StripGridProps) {
  return (
    <Stretched height={grid.top + grid.rows * grid.laneHeight}>
      <GridLines {...grid} />
    </Stretched>
  )
}

/** The grid of many strips that are alike, drawn once under a name: place it before the first of them. */
export function SharedGrid({ id, ...grid }: StripGridProps & { readonly id: string }) {
  return (
    <svg width="0" height="0" aria-hidden="true" className="absolute">
      <symbol id={id} viewBox={`0 0 1000 ${grid.top + grid.rows * grid.laneHeight}`} preserveAspectRatio="none">
        <GridLines {...grid} />
      </symbol>
    </svg>
  )
}

function GridLines({ ticks, rows, top, laneHeight }: StripGridProps) {
  const bottom = top + rows * laneHeight
  const start = rows === 0 ? top - 6 : top
  const hours = ticks.map(tick => `M${tick.x} ${start}V${bottom}`).join('')
  const lanes = Array.from({ length: rows }, (_, row) => `M0 ${top + (row + 0.5) * laneHeight}H1000`).join('')
  return (
    <>
      <path d={hours} className="fill-none stroke-line" vectorEffect="non-scaling-stroke" />
      <path d={lanes} className="fill-none stroke-line" strokeDasharray="1 3" vectorEffect="non-scaling-stroke" />
    </>
  )
}

type Outline = keyof LaneShapes['outlines']

const outlines: Readonly<Record<Outline, string>> = {
  upcoming: 'fill-surface stroke-soon stroke-[1.5]',
  'due soon': 'fill-surface stroke-soon stroke-3',
  due: 'fill-due-fill stroke-due stroke-[1.5]',
  deferred: 'fill-surface stroke-ink2 stroke-[1.5]',
  suspended: 'fill-none stroke-ink3 stroke-[1.5] [stroke-dasharray:4_3]',
}
const outlineNames = Object.keys(outlines) as Outline[]

interface StripShapesProps {
  readonly shapes: LaneShapes
  readonly height: number
}

export function StripShapes({ shapes, height }: StripShapesProps) {
  return (
    <>
      <Stretched height={height}>
        {outlineNames.map(name => (
          <Line key={name} d={shapes.outlines[name]} look={outlines[name]} />
        ))}
        <Line d={shapes.done} look="fill-none stroke-done stroke-8 [stroke-linecap:round]" />
      </Stretched>
      {shapes.late.map(box => (
        <rect
          key={box.y}
          x={percent(box.x)}
          y={box.y}
          width={percent(box.width)}
          height={box.height}
          fill={HATCH}
          className="stroke-late stroke-[1.5]"
        />
      ))}
      {shapes.seriousEdges !== '' && (
        <Stretched height={height}>
          <Line d={shapes.seriousEdges} look="fill-none stroke-late stroke-6" />
        </Stretched>
      )}
      {shapes.outOfRange.map(({ x, y }) => (
        <use key={`${x} ${y}`} href={TRIANGLE} x={percent(x)} y={y} />
      ))}
      {shapes.notes.map(({ x, y }) => (
        <use key={`${x} ${y}`} href={NOTE} x={percent(x)} y={y} />
      ))}
    </>
  )
}

interface LineProps {
  readonly d: string
  readonly look: string
}

/** Nothing when there is nothing to draw: a page of strips stays small. */
function Line({ d, look }: LineProps) {
  if (d === '') return null
  return <path d={d} className={look} strokeLinejoin="round" vectorEffect="non-scaling-stroke" />
}
