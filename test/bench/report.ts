import type { Figure, Times } from './compare.ts'

const heads = ['', 'ours', 'floor', 'ratio', 'at most', 'median ms', '']

/** The figures as a table of text. */
export function table(rows: readonly (readonly [Figure, Times])[]): string {
  const cells = rows.map(([figure, times]) => [
    figure.name,
    figure.value.toFixed(2),
    figure.floor.toFixed(2),
    figure.ratio.toFixed(2),
    String(figure.target),
    times.map(time => time.toFixed(1)).join(' / '),
    figure.met ? 'met' : 'MISSED',
  ])
  const widths = heads.map((head, column) => Math.max(head.length, ...cells.map(row => row[column]?.length ?? 0)))
  const line = (row: readonly string[]) =>
    row
      .map((cell, column) => (column === 0 ? cell.padEnd(widths[0] ?? 0) : cell.padStart(widths[column] ?? 0)))
      .join('  ')
  return [
    'CPU in ms a request, server and database together; median time of an answer with four under way, ours / floor.',
    line(heads),
    ...cells.map(line),
  ].join('\n')
}
