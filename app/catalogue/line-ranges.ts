/** Numbers of lines in words, neighbours together: `2 to 4, 7`. */
export function lineRanges(lines: readonly number[]): string {
  const ranges: { from: number; to: number }[] = []
  for (const line of lines.toSorted((a, b) => a - b)) {
    const last = ranges.at(-1)
    if (last && line <= last.to + 1) last.to = line
    else ranges.push({ from: line, to: line })
  }
  return ranges.map(({ from, to }) => (from === to ? String(from) : `${from} to ${to}`)).join(', ')
}
