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
  /** Many rows beside something else: it scrolls downwards within itself, under its headings. */
  readonly isTall?: boolean
}

/** Rows of the same facts. Wider than the screen, it scrolls within itself. */
export function Table({ caption, captionShown = false, columns, rows, isTall = false }: TableProps) {
  const pad = isTall ? 'px-2 py-0.5 sm:px-3' : 'px-4 py-2.5'
  const room = isTall ? 'max-h-104 overflow-auto print:max-h-none' : 'overflow-x-auto'
  return (
    // biome-ignore lint/a11y/noNoninteractiveTabindex: a region that scrolls must be reachable by keyboard
    <section tabIndex={0} aria-label={caption} className={`${room} print:overflow-visible`}>
      <table className="w-full border-collapse text-left">
        <caption className={captionShown ? 'px-4 py-2 text-left font-semibold' : 'sr-only'}>{caption}</caption>
        <thead className={isTall ? 'sticky top-0 bg-surface print:static' : ''}>
          <tr className="border-b border-line text-sm text-ink2">
            {columns.map(column => (
              <th
                key={column.label}
                scope="col"
                className={`${isTall ? 'px-2 sm:px-3' : 'px-4'} py-2 font-semibold ${column.numeric ? 'whitespace-nowrap' : ''} ${aligned(column)}`}
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
                  <th key={column.label} scope="row" className={`${pad} font-semibold ${aligned(column)}`}>
                    {row.cells[index]}
                  </th>
                ) : (
                  <td key={column.label} className={`${pad} ${aligned(column)}`}>
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
