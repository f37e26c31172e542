import { showDateTime, showDay, showDuration } from '../time/display.ts'
import type { Zone } from '../time/zone.ts'
import { placed } from './plot-scale.ts'
import type { FindingsView } from './trend-findings.ts'
import type { LengthsView } from './trend-lengths.ts'
import type { MeasureView } from './trend-measures.ts'

/** The ends of the axis of a measure. */
export function scaleOfTicks(ticks: readonly number[]): { readonly from: number; readonly to: number } {
  return { from: ticks[0] ?? 0, to: ticks.at(-1) ?? 1 }
}

/** What a plot of numbers shows, in sentences: how many, how many out of range, the target, the latest. */
export function measureWords({ readings, bands, marks }: MeasureView, zone: Zone): string {
  const last = readings.at(-1)
  if (!last) return 'Nothing was charted in this span.'
  const out = (mark: string) =>
    readings.filter(({ values }) => values.some(one => one.mark === mark && one.isOut)).length
  const outside = marks.flatMap(({ name, label }) => {
    const count = out(name)
    return count === 0 ? [] : [`${marks.length > 1 ? `${label}: ` : ''}${count} out of range`]
  })
  const values = last.values.map(({ mark, words }) => {
    const label = marks.find(({ name }) => name === mark)?.label ?? mark
    return marks.length > 1 ? `${label.toLowerCase()} ${words}` : words
  })
  return [
    `${readings.length} ${readings.length === 1 ? 'reading' : 'readings'}.`,
    ...(bands.length > 0 ? [`${outside.length > 0 ? outside.join(', ') : 'None out of range'}.`] : []),
    ...bands.map(({ words, from }) => `Target ${words} from ${showDateTime(new Date(from), zone)}.`),
    `Latest on ${showDateTime(new Date(last.at), zone)}: ${values.join(', ')}.`,
  ].join(' ')
}

/** Values that lie beyond the plot and are drawn at its edge, one in a line. */
export function beyondWords({ readings, ticks, marks }: MeasureView, zone: Zone): readonly string[] {
  const scale = scaleOfTicks(ticks)
  return readings.flatMap(({ at, values }) =>
    values
      .filter(({ value }) => placed(value, scale).beyond !== undefined)
      .map(({ mark, words }) => {
        const label = marks.find(({ name }) => name === mark)?.label ?? mark
        return `${label} ${words} on ${showDateTime(new Date(at), zone)}`
      }),
  )
}

/** What the matrix of findings shows, in sentences. */
export function findingsWords({ days, rows }: FindingsView): string {
  const looked = days.filter(({ looks }) => looks.length > 0)
  if (looked.length === 0) return 'Nothing was charted in this span.'
  const seen = rows.map(({ label, levels }) => {
    const on = days.filter((_, index) => (levels[index] ?? 0) > 0)
    const last = on.at(-1)
    return `${label}: ${on.length} of ${looked.length} days${last ? `, last ${showDay(last.day)}` : ''}`
  })
  return `Looked at on ${looked.length} of ${days.length} days. ${seen.length === 0 ? 'Nothing found' : seen.join('. ')}.`
}

/** How often each sort was reached, failed or ended early, in sentences. */
export function lengthsWords({ groups }: LengthsView): string {
  if (groups.length === 0) return 'Nothing was charted in this span.'
  return groups
    .map(({ label, lengths }) => {
      const [latest] = lengths
      const ends = [...new Set(lengths.map(({ verdict }) => verdict))].map(
        verdict => `${lengths.filter(one => one.verdict === verdict).length} ${verdict.toLowerCase()}`,
      )
      return `${label}: ${ends.join(', ')}${latest ? `; latest ${showDuration(latest.length)}` : ''}.`
    })
    .join(' ')
}
