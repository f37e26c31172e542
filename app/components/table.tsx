import type { ReactNode } from 'react'

export interface Column {
  readonly label: string
  readonly numeric?: boolean
}
export interface Row {
  readonly key: string
  /** The first cell names the row. */
  readonly cells: readonly ReactNode[]
  readonly className?: string
}
export interface TableProps {
  /** Read out as the table's name; shown above it unless the heading before it says the same. */
  readonly caption: string
  readonly captionShown?: boolean
  readonly columns: readonly Column[]
  readonly rows: readonly Row[]
}

/** Rows of the same facts. Wider than the screen, it scrolls within itself. */
export function Table({ caption, captionShown = false, columns, rows }: TableProps) {
  return (
    // biome-ignore lint/a11y/noNoninteractiveTabindex: a region that scrolls must be reachable by keyboard
    <section tabIndex={0} aria-label={caption} className="overflow-x-auto print:overflow-visible">
      <table className="w-full border-collapse text-left">
        <caption className={captionShown ? 'px-4 py-2 text-left font-semibold' : 'sr-only'}>{caption}</caption>
        <thead>
          <tr className="border-b border-line text-sm text-ink2">
            {columns.map(column => (
              <th
                key={column.label}
                scope="col"
                className={`px-4 py-2 font-semibold ${column.numeric ? 'whitespace-nowrap' : ''} ${aligned(column)}`}
              >
                {column.label}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {rows.map(row => (
            <tr key={row.key} className={`border-b border-hair last:border-0 ${row.className ?? ''}`}>
              {columns.map((column, index) =>
                index === 0 ? (
                  <th key={column.label} scope="row" className={`px-4 py-2.5 font-semibold ${aligned(column)}`}>
                    {row.cells[index]}
                  </th>
                ) : (
                  <td key={column.label} className={`px-4 py-2.5 ${aligned(column)}`}>
                    {row.cells[index]}
                  </td>
                ),
              )}
            </tr>
          ))}
        </tbody>
      </table>
    </section>
  )
}

const aligned = ({ numeric = false }: Column): string => (numeric ? 'text-right' : '')
