import { render, screen } from '@testing-library/react'
import { expect, test } from 'vitest'
import { HourStrip, type HourStripProps } from '#app/components/hour-strip.tsx'
import { gridTicks, labelled } from '#app/components/hour-ticks.ts'
import type { StripLane } from '#app/components/strip-lanes.ts'

const at = (time: string) => new Date(`2026-12-01T${time}:00Z`)
const board = { from: at('06:00'), to: at('20:00'), now: at('14:06'), zone: 'Etc/UTC', width: 530 }

const lane = (name: string, given: Partial<StripLane>): StripLane => ({ name, marks: [], windows: [], ...given })

const overdue = lane('Inner cannula', {
  marks: [{ at: at('06:10'), shape: 'done', says: () => 'Inner cannula changed at 06:10' }],
  windows: [
    {
      opensAt: at('11:14'),
      closesAt: at('12:14'),
      status: 'overdue',
      says: 'Inner cannula change, 1 h 52 min late',
    },
  ],
})
const outOfRange = lane('Cuff', {
  marks: [{ at: at('06:30'), shape: 'out of range', says: () => 'Cuff pressure 34 cmH2O at 06:30' }],
})

function strip(given: Partial<HourStripProps> = {}) {
  return render(<HourStrip {...board} lanes={[overdue, outOfRange]} axis title="Care of MERRIN, Tobias" {...given} />)
}

test('the strip says in words what it draws', () => {
  strip()
  expect(screen.getByRole('img')).toHaveAccessibleName(
    'Care of MERRIN, Tobias. Inner cannula: Inner cannula change, 1 h 52 min late; Inner cannula changed at 06:10. Cuff: Cuff pressure 34 cmH2O at 06:30.',
  )
})

test('a late bar runs from the end of its window to now, hatched', () => {
  const { container } = strip()
  const bar = container.querySelector('rect[fill="url(#strip-late)"]')
  // 12:14 is 6 h 14 min of 14 h, and 1 h 52 min more is 14:06.
  expect(bar).toHaveAttribute('x', '44.5%')
  expect(bar).toHaveAttribute('width', '13.3%')
})

test('a seriously overdue bar has a solid left edge', () => {
  const serious = {
    ...overdue,
    windows: overdue.windows.map(window => ({ ...window, status: 'seriously overdue' as const })),
  }
  expect(strip({ lanes: [overdue] }).container.querySelectorAll('.stroke-late.fill-none')).toHaveLength(0)
  expect(strip({ lanes: [serious] }).container.querySelectorAll('.stroke-late.fill-none')).toHaveLength(1)
})

test('care outside the span is not drawn', () => {
  const { container } = strip({
    lanes: [
      lane('Tube', {
        marks: [{ at: at('05:00'), shape: 'done', says: () => 'Tube changed at 05:00' }],
        windows: [{ opensAt: at('21:00'), closesAt: at('22:00'), status: 'upcoming', says: 'Tube change at 21:00' }],
      }),
    ],
  })
  expect(container.querySelector('.stroke-done')).toBeNull()
  expect(container.querySelector('.stroke-soon')).toBeNull()
})

test('a strip of five busy lanes stays a few elements', () => {
  const busy = lane('Suction', {
    marks: Array.from({ length: 40 }, (_, n) => ({
      at: new Date(at('06:00').getTime() + n * 600_000),
      shape: 'done' as const,
      says: () => 'Suction',
    })),
    windows: [{ opensAt: at('15:00'), closesAt: at('16:00'), status: 'upcoming', says: 'Suction check at 15:30' }],
  })
  const { container } = strip({ lanes: ['a', 'b', 'c', 'd', 'e'].map(name => ({ ...busy, name })), axis: false })
  expect(container.querySelectorAll('svg *').length).toBeLessThan(12)
})

test.each([
  ['14 h on a board', '06:00', '20:00', 530, '06:00 08:00 10:00 12:00 14:00 16:00 18:00 20:00'],
  [
    '12 h on a chart',
    '08:00',
    '20:00',
    880,
    '08:00 09:00 10:00 11:00 12:00 13:00 14:00 15:00 16:00 17:00 18:00 19:00 20:00',
  ],
  ['14 h on a phone', '06:00', '20:00', 240, '08:00 12:00 16:00 20:00'],
])('%s has a grid as fine as its labels allow', (_, from, to, width, labels) => {
  const ticks = gridTicks({ from: at(from), to: at(to) }, 'Etc/UTC', width)
  expect(ticks.map(tick => tick.label).join(' ')).toBe(labels)
})

test('a week counts midnights', () => {
  const ticks = gridTicks({ from: new Date('2026-11-26T10:00Z'), to: new Date('2026-12-03T10:00Z') }, 'Etc/UTC', 880)
  expect(ticks.map(tick => tick.label)).toEqual(['27-Nov', '28-Nov', '29-Nov', '30-Nov', '01-Dec', '02-Dec', '03-Dec'])
})

test('an hour that clocks repeat stands twice on the grid, and the hours after it stay true', () => {
  // Zurich goes back from 03:00 to 02:00 at 01:00 UTC.
  const span = { from: new Date('2026-10-24T23:00Z'), to: new Date('2026-10-25T03:00Z') }
  expect(gridTicks(span, 'Europe/Zurich', 880).map(tick => tick.label)).toEqual([
    '01:00',
    '02:00',
    '02:00',
    '03:00',
    '04:00',
  ])
})

test('an hour that clocks jump over does not stand on the grid', () => {
  const span = { from: new Date('2026-03-28T23:00Z'), to: new Date('2026-03-29T03:00Z') }
  expect(gridTicks(span, 'Europe/Zurich', 880).map(tick => tick.label)).toEqual([
    '00:00',
    '01:00',
    '03:00',
    '04:00',
    '05:00',
  ])
})

test('labels keep clear of the time at the now line, of the ends and of each other', () => {
  const ticks = gridTicks({ from: board.from, to: board.to }, 'Etc/UTC', 530)
  expect(labelled(ticks, 530, 579).map(tick => tick.label)).toEqual(['08:00', '10:00', '12:00', '16:00', '18:00'])
  expect(labelled(ticks, 200, 579).map(tick => tick.label)).toEqual(['08:00', '18:00'])
})
