import type { ReactNode } from 'react'

export interface Datum {
  readonly label: string
  readonly value: ReactNode
  readonly tone?: 'due' | 'late'
}
export interface DataListProps {
  readonly items: readonly Datum[]
}

const tones = { due: 'text-due', late: 'text-late' } as const

/** Labels with values: labels lighter, values firm. */
export function DataList({ items }: DataListProps) {
  return (
    <dl className="grid grid-cols-[minmax(6rem,2fr)_3fr] gap-x-4 gap-y-1.5">
      {items.map(({ label, value, tone }) => (
        <div key={label} className="contents">
          <dt className="text-ink2">{label}</dt>
          <dd className={`min-w-0 font-semibold ${tone ? tones[tone] : ''}`}>{value}</dd>
        </div>
      ))}
    </dl>
  )
}
