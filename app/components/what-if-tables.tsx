import type { Load } from '#app/rules/what-if.ts'
import { Table } from './table.tsx'

/** One line of the comparison: the load under the version in force (null when there is none) and under the draft. */
export interface LoadLine {
  readonly label: string
  readonly inForce: Load | null
  readonly draft: Load
}

/** What the draft would have asked for in the last days, beside the version in force. */
export interface WhatIf {
  readonly days: number
  readonly patients: number
  readonly withoutRules: number
  readonly total: LoadLine
  readonly byShift: readonly LoadLine[]
  readonly byTask: readonly LoadLine[]
}

interface WhatIfTablesProps {
  readonly whatIf: WhatIf
}

/** What the draft would have asked for, beside the version in force. */
export function WhatIfTables({ whatIf: { days, patients, withoutRules, total, byShift, byTask } }: WhatIfTablesProps) {
  return (
    <div className="grid grid-cols-[minmax(0,1fr)] gap-4">
      <div className="grid max-w-prose gap-2 px-4 text-ink2">
        <p>
          The last {days} days of this ward, {patients === 1 ? '1 patient' : `${patients} patients`}, as they were
          charted. Tasks: how often care would have fallen due. Late: how often the care that was charted would have
          come after its window.
        </p>
        {withoutRules > 0 && (
          <p>
            {withoutRules === 1 ? '1 patient is' : `${withoutRules} patients are`} left out: there is no rule set for
            children here.
          </p>
        )}
      </div>
      <LoadTable caption="Each shift of a day, on average" lines={[total, ...byShift]} per={days} />
      <LoadTable caption={`Each task, in ${days} days`} lines={byTask} per={1} />
    </div>
  )
}

interface LoadTableProps {
  readonly caption: string
  readonly lines: readonly LoadLine[]
  readonly per: number
}

function LoadTable({ caption, lines, per }: LoadTableProps) {
  const show = (count: number | undefined) =>
    count === undefined ? 'none' : String(Math.round((count / per) * 10) / 10)
  return (
    <Table
      caption={caption}
      captionShown
      columns={[
        { label: per === 1 ? 'Task' : 'Shift' },
        { label: 'Tasks, in force', numeric: true },
        { label: 'Tasks, draft', numeric: true },
        { label: 'Late, in force', numeric: true },
        { label: 'Late, draft', numeric: true },
      ]}
      rows={lines.map(({ label, inForce, draft }) => ({
        key: label,
        cells: [label, show(inForce?.tasks), show(draft.tasks), show(inForce?.late), show(draft.late)],
        className: isSame(inForce, draft) ? '' : 'bg-due-tint',
      }))}
    />
  )
}

const isSame = (a: Load | null, b: Load): boolean => a?.tasks === b.tasks && a.late === b.late
