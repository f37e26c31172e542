/** Rows as a CSV file that table programs open as UTF-8, and in which no cell is taken for a formula. */
export function csvOf(rows: readonly (readonly string[])[]): string {
  return `\uFEFF${rows.map(cells => `${cells.map(cell).join(',')}\r\n`).join('')}`
}

function cell(text: string): string {
  const harmless = /^[=+\-@\t\r]/.test(text) ? `'${text}` : text
  return /[",\r\n]/.test(harmless) ? `"${harmless.replaceAll('"', '""')}"` : harmless
}
