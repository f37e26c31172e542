import { Link } from 'react-router'
import type { ComparedTube, Comparison, TubeCatheters } from '#app/catalogue/compare.ts'
import { type CatalogueTube, tubeName } from '#app/catalogue/item.ts'
import { Card } from './card.tsx'
import { Table } from './table.tsx'

export interface ComparedTubesProps {
  readonly present: { readonly tube: ComparedTube; readonly catheters: TubeCatheters | null }
  readonly candidates: readonly (Comparison<Pick<CatalogueTube, 'id'> & ComparedTube> & {
    readonly catheters: TubeCatheters | null
  })[]
}

type Candidate = ComparedTubesProps['candidates'][number]

const numeric = (label: string) => ({ label, numeric: true })
const cuffs = { none: 'No cuff', air: 'Air', water: 'Water', foam: 'Foam' } as const
const connectors = { outer: 'Outer tube', inner: 'Inner cannula', none: 'None' } as const

/** Tubes of the catalogue beside the present one: what differs in mm, in resistance, and what else changes with each. */
export function ComparedTubes({ present, candidates }: ComparedTubesProps) {
  return (
    <Card title="Others in the catalogue" flush>
      <p className="max-w-3xl px-4 pb-2 text-ink2">
        Nearest outside diameter first, then inside diameter with the inner cannula in, length, cuff, connector. In
        brackets: the difference from the present tube in mm. Resistance is an approximation for laminar flow, by the
        fourth power of the inside diameter; turbulent flow is hindered more.
      </p>
      <Table
        caption="Others in the catalogue"
        columns={[
          { label: 'Tube' },
          numeric('OD mm'),
          numeric('ID mm'),
          numeric('Length mm'),
          numeric('Resistance'),
          { label: 'Cuff' },
          { label: 'Connector' },
          { label: 'Changes with it' },
        ]}
        rows={candidates.map(candidate => ({ key: candidate.tube.id, cells: cellsOf(candidate, present) }))}
      />
    </Card>
  )
}

function cellsOf(candidate: Candidate, present: ComparedTubesProps['present']) {
  const { tube, odMm, idMm, lengthMm, resistance } = candidate
  return [
    <Link
      key="tube"
      to={`/catalogue/tubes/${tube.id}`}
      className="inline-flex min-h-11 min-w-56 items-center py-1 underline underline-offset-3"
    >
      {tubeName(tube)}
    </Link>,
    <Measure key="od" value={tube.od} by={odMm} />,
    <Measure key="id" value={tube.idWithInner ?? tube.idWithoutInner} by={idMm} />,
    <Measure key="length" value={tube.lengthMm} by={lengthMm} />,
    <span key="resistance" className="whitespace-nowrap">{`${resistance.toFixed(2)} times`}</span>,
    `${cuffs[tube.cuff]}${candidate.isSameCuff ? '' : ' (other)'}`,
    `${connectors[tube.connector]}${candidate.isSameConnector ? '' : ' (other)'}`,
    changesOf(candidate, present).join('. '),
  ]
}

interface MeasureProps {
  readonly value: number
  readonly by: number
}

function Measure({ value, by }: MeasureProps) {
  const sign = by > 0 ? '+' : by < 0 ? '−' : '±'
  return (
    <span className="whitespace-nowrap">
      {value.toFixed(1)} <span className="text-ink2">({`${sign}${Math.abs(by).toFixed(1)}`})</span>
    </span>
  )
}

/** What has to be at the bed with it, and what at the bed is of no use any more. */
function changesOf(
  { tube, isSameLine, catheters }: Candidate,
  present: ComparedTubesProps['present'],
): readonly string[] {
  const largest = (of: TubeCatheters | null) => of?.largestFr
  const fr = largest(catheters)
  const inner = tube.innerCannula === null ? 'No inner cannula' : `Inner cannulas of ${tube.line}, ${tube.innerCannula}`
  const isSameSize = isSameLine && tube.size === present.tube.size && tube.sizeSystem === present.tube.sizeSystem
  return [
    ...(isSameSize && tube.innerCannula === present.tube.innerCannula ? [] : [inner]),
    ...(catheters && fr !== largest(present.catheters)
      ? [fr === undefined ? 'No suction catheter in stock fits' : `Suction catheter ${fr} Fr at most`]
      : []),
    ...(isSameSize ? [] : [`Spare tubes of ${tube.line}, same and one size smaller`]),
    ...(tube.fenestrated === present.tube.fenestrated
      ? []
      : [tube.fenestrated === 'yes' ? 'Fenestrated' : 'Not fenestrated']),
    ...(tube.flange === present.tube.flange ? [] : [`${tube.flange === 'fixed' ? 'Fixed' : 'Adjustable'} flange`]),
  ]
}
