import { Link } from 'react-router'
import type { DwellStage } from '#app/clinical/dwell.ts'
import type { TubeRow } from '#app/rules/tube-row.ts'
import { showDay } from '#app/time/display.ts'
import { Table } from './table.tsx'
import { Tag, type TagTone } from './tag.tsx'

interface TubeTableProps {
  readonly tubes: readonly (TubeRow & {
    readonly patientId: string
    readonly wardName: string
    readonly bed: string
    readonly familyName: string
    readonly givenName: string
  })[]
}

const toneOfStage: Readonly<Record<DwellStage, TagTone>> = {
  quiet: 'plain',
  notice: 'soon',
  strong: 'due',
  'limit day': 'due',
  'past limit': 'late',
}

/** Tubes as rows: whose, which, how long in, by when it is changed and for when that is planned. */
export function TubeTable({ tubes }: TubeTableProps) {
  if (tubes.length === 0) return <p className="p-4">No tube is in place on these wards.</p>
  return (
    <Table
      caption="Tubes in place"
      columns={['Bed', 'Change by', 'Tube', 'In for', 'Planned for', 'To notice'].map(label => ({ label }))}
      rows={tubes.map(tube => ({
        key: tube.tubeId,
        cells: [
          <Whose key="whose" {...tube} />,
          <ChangeBy key="by" {...tube} />,
          <span key="tube" className="block min-w-44 wrap-anywhere">{`${tube.line} ${tube.words}`}</span>,
          <span key="day" className="whitespace-nowrap">
            {`Day ${tube.day}${tube.limit === null ? '' : ` of ${tube.limit}`}`}
          </span>,
          tube.plannedOn === null
            ? 'Not planned'
            : `${showDay(tube.plannedOn)}${tube.operator ? `, ${tube.operator}` : ''}`,
          <Notes key="notes" warnings={tube.warnings} />,
        ],
      }))}
    />
  )
}

type Row = TubeTableProps['tubes'][number]

function Whose({ patientId, bed, wardName, familyName, givenName }: Row) {
  return (
    <span className="block min-w-32 wrap-anywhere">
      <Link to={`/patients/${patientId}`} className="inline-flex min-h-11 items-center underline underline-offset-3">
        {bed} {familyName}, {givenName}
      </Link>
      <span className="block text-sm font-normal text-ink2">{wardName}</span>
    </span>
  )
}

function ChangeBy({ changeBy, stage, daysLeft }: Row) {
  if (changeBy === null || daysLeft === null) return 'No rule for this patient'
  const left = daysLeft < 0 ? `${-daysLeft} d past` : daysLeft === 0 ? 'today' : `${daysLeft} d left`
  return (
    <span className="flex flex-wrap items-center gap-x-2 gap-y-1 whitespace-nowrap">
      {showDay(changeBy)} <Tag tone={toneOfStage[stage]}>{left}</Tag>
    </span>
  )
}

function Notes({ warnings }: Pick<Row, 'warnings'>) {
  if (warnings.length === 0) return 'Nothing'
  return (
    <ul className="grid min-w-60 gap-1 text-sm">
      {warnings.map(({ name, action, cause }) => (
        <li key={name}>
          <b className="font-semibold">{action}</b> {cause}
        </li>
      ))}
    </ul>
  )
}
