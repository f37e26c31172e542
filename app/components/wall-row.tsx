import type { ReactNode } from 'react'
import type { TaskStatus } from '#app/rules/status.ts'
import type { NextCare } from './board-row.tsx'
import { edgeOf } from './status-look.ts'

export interface WallPatient {
  readonly bed: string
  /** `M. T.`: nobody in the corridor reads a name. */
  readonly initials: string
  readonly worst: TaskStatus
  /** Most pressing first; the wall shows one, and how many more press. */
  readonly next: readonly NextCare[]
}

export interface WallRowProps {
  readonly patient: WallPatient
  /** The hour strip, with tall lanes. */
  readonly children: ReactNode
}

const pressing: readonly TaskStatus[] = ['due', 'overdue', 'seriously overdue']

/** One bed, to be read from four metres: an item of a list, with nothing to press. */
export function WallRow({ patient, children }: WallRowProps) {
  const { bed, initials, worst, next } = patient
  const [first, ...others] = next.filter(care => pressing.includes(care.status))
  const isLate = worst === 'overdue' || worst === 'seriously overdue'
  return (
    <li
      className={`grid grid-cols-[10rem_minmax(0,1fr)_minmax(0,34rem)] items-center gap-x-8 border-t border-line px-6 py-3 pl-8 first:border-0 ${edgeOf[worst]}`}
    >
      <p className="leading-none">
        <span className="block text-5xl font-bold tracking-tight">
          <span className="sr-only">Bed </span>
          {bed}
        </span>
        <span className="text-2xl text-ink2">{initials}</span>
      </p>
      <div className="min-w-0">{children}</div>
      <p className={`text-3xl leading-tight font-bold ${isLate ? 'text-late' : first ? 'text-due' : 'text-ink2'}`}>
        {first ? (
          <>
            <span className="block">{first.says}</span>
            <span className="text-2xl font-semibold text-ink">{first.title}</span>
            {others.length > 0 && <span className="text-2xl font-semibold text-ink2">{`, ${others.length} more`}</span>}
          </>
        ) : (
          'Nothing due now'
        )}
      </p>
    </li>
  )
}
