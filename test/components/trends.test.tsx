import { render, screen, within } from '@testing-library/react'
import { MemoryRouter } from 'react-router'
import { expect, test } from 'vitest'
import { FindingsCard, LengthsCard, MeasureCard } from '#app/components/trend-card.tsx'
import type { FindingsView } from '#app/rules/trend-findings.ts'
import type { LengthsView, LengthView } from '#app/rules/trend-lengths.ts'
import type { MeasureView, ReadingView } from '#app/rules/trend-measures.ts'

const at = (time: string) => new Date(`2026-12-01T${time}:00Z`)
const shown = { span: { from: at('00:00'), to: at('20:00') }, now: at('20:00').getTime(), zone: 'Etc/UTC' }

const show = (card: React.ReactNode) => render(<MemoryRouter>{card}</MemoryRouter>)

const value = (mark: string, number: number, isOut: boolean | null) => ({
  ...{ mark, value: number, isOut },
  words: `${number} cmH2O`,
})
const reading = (time: string, values: ReadingView['values'], remark = 'In range'): ReadingView => ({
  at: at(time).getTime(),
  entryId: `entry-${time}`,
  values,
  remark,
})
const band = (from: string, to: string, upper: number) => ({
  ...{ from: at(from).getTime(), to: at(to).getTime(), lower: 20, upper },
  words: `20 to ${upper} cmH2O`,
  origin: 'Tracheostomy care, version 1',
})
const pressure: MeasureView = {
  shape: 'measure',
  name: 'cuff-pressure',
  title: 'Cuff pressure',
  says: 'Found and left at.',
  unit: 'cmH2O',
  ticks: [0, 10, 20, 30, 40, 50],
  marks: [
    { name: 'found', label: 'Found' },
    { name: 'left', label: 'Left at' },
  ],
  isJoined: false,
  readings: [
    reading('05:00', [value('found', 26, false), value('left', 26, false)]),
    reading('10:00', [value('found', 62, true), value('left', 25, false)], 'Found very high, left in range'),
    reading('15:00', [value('found', 0, null), value('left', 0, null)], 'Cuff down: no band applies'),
  ],
  bands: [band('00:00', '12:00', 30), band('12:00', '20:00', 25)],
  why: null,
}

/** What is drawn by reference, with its place across and down. */
const drawn = (container: HTMLElement) =>
  [...container.querySelectorAll('svg[role=img] use')].map(use =>
    ['href', 'x', 'y'].map(name => use.getAttribute(name)).join(' '),
  )

test('readings are drawn by shape at their time and value; one beyond the plot at its edge, with an arrow', () => {
  const { container } = show(<MeasureCard view={pressure} {...shown} />)
  // 26 of 50 is 88.4 px above the foot at 184 px; 62 lies at the top, 14 px.
  expect(drawn(container)).toEqual([
    '#plot-hollow 25% 95.6',
    '#plot-full 25% 95.6',
    '#strip-triangle 50% 14',
    '#plot-above 50% 14',
    '#plot-full 50% 99',
    '#plot-unjudged 75% 184',
    '#plot-unjudged 75% 184',
  ])
  expect(screen.getByText(/^Beyond the plot, drawn at its edge: Found 62 cmH2O on 01-Dec-2026 10:00\.$/)).toBeVisible()
})

test('the target has a step where it became another', () => {
  const { container } = show(<MeasureCard view={pressure} {...shown} />)
  const rects = [...container.querySelectorAll('svg[role=img] rect')].map(rect =>
    ['x', 'width', 'y', 'height'].map(name => rect.getAttribute(name)).join(' '),
  )
  expect(rects).toEqual(['0 600 82 34', '600 400 99 17'])
})

test('a reader hears what the plot shows, and the table holds every value with its entry', () => {
  show(<MeasureCard view={pressure} {...shown} />)
  expect(screen.getByRole('img')).toHaveAccessibleName(
    'Cuff pressure 3 readings. Found: 1 out of range. Target 20 to 30 cmH2O from 01-Dec-2026 00:00. Target 20 to 25 cmH2O from 01-Dec-2026 12:00. Latest on 01-Dec-2026 15:00: found 0 cmH2O, left at 0 cmH2O.',
  )
  const rows = within(screen.getByRole('table', { name: 'Values of Cuff pressure' })).getAllByRole('row')
  expect(rows.map(({ textContent }) => textContent)).toEqual([
    'WhenFoundLeft atRemark',
    '15:000 cmH2O0 cmH2OCuff down: no band applies',
    '10:0062 cmH2O25 cmH2OFound very high, left in range',
    '05:0026 cmH2O26 cmH2OIn range',
  ])
  expect(screen.getByRole('link', { name: '10:00' })).toHaveAttribute('href', '/entries/entry-10:00')
})

const findings: FindingsView = {
  shape: 'findings',
  name: 'stoma-and-skin',
  title: 'Stoma and skin',
  says: 'The worst of each day.',
  days: [
    { day: '2026-11-30', looks: [{ entryId: 'a', time: '08:00' }], found: ['Exudate scant'] },
    { day: '2026-12-01', looks: [], found: [] },
    { day: '2026-12-02', looks: [{ entryId: 'b', time: '09:00' }], found: [] },
    { day: '2026-12-03', looks: [{ entryId: 'c', time: '09:00' }], found: ['Exudate copious'] },
  ],
  rows: [{ name: 'exudate', label: 'Exudate', levels: [1, null, 0, 3] }],
  notSeen: ['Pus', 'Warmth'],
}

test('findings are bars as tall as there was much, a line where they were looked for, and nothing without a look', () => {
  const { container } = show(<FindingsCard view={findings} {...shown} />)
  const [bars, looks] = [...container.querySelectorAll('svg[role=img] path')].map(path => path.getAttribute('d'))
  expect(bars).toBe('M80 25v-7h90v7zM830 25v-22h90v22z')
  expect(looks).toBe('M580 25h90')
  expect(screen.getByText('Not seen in this span: pus, warmth.')).toBeVisible()
  const cells = within(screen.getByRole('table')).getAllByRole('row')
  expect(cells.map(({ textContent }) => textContent)).toEqual([
    'DayLooksFound',
    '03-Dec-202609:00Exudate copious.',
    '02-Dec-202609:00Nothing found',
    '01-Dec-2026Nobody looked',
    '30-Nov-202608:00Exudate scant.',
  ])
})

const hour = 3_600_000
const length = (more: Partial<LengthView>): LengthView => ({
  ...{ entryId: 'x', startedAt: at('02:00').getTime(), endedAt: null, length: 6 * hour, target: 12 * hour },
  ...{ end: 'running', verdict: 'Running', because: '' },
  ...more,
})
const trials: LengthsView = {
  shape: 'lengths',
  name: 'weaning-trials',
  title: 'Weaning trials',
  says: 'How long each was borne.',
  groups: [
    {
      name: 'valve',
      label: 'One-way valve',
      lengths: [
        length({ entryId: 'a' }),
        length({ entryId: 'b', length: hour, end: 'failed', verdict: 'Failed', because: 'Stridor' }),
        length({ entryId: 'c', length: 12 * hour, end: 'reached', verdict: 'Passed', because: 'As planned' }),
      ],
    },
  ],
  ticks: [0, 6, 12].map(count => count * hour),
}

test('lengths are bars against their target, told apart by fill and outline', () => {
  const { container } = show(<LengthsCard view={trials} {...shown} />)
  const bars = [...container.querySelectorAll('svg[role=img] > rect')]
  expect(bars.map(bar => bar.getAttribute('width'))).toEqual(['50%', '8.3%', '100%'])
  expect(new Set(bars.map(bar => `${bar.getAttribute('class')} ${bar.getAttribute('fill')}`)).size).toBe(3)
  expect(screen.getByRole('img')).toHaveAccessibleName(/One-way valve: 1 running, 1 failed, 1 passed; latest 6 h\.$/)
  expect(screen.getByRole('cell', { name: 'Failed. Stridor' })).toBeVisible()
})
