// Dwell limits in print: 28 days (National Tracheostomy Safety Project), 29 (one hospital), 30 (Royal Marsden Manual). That the day of
// insertion is day 0 is a fixed product rule; the dates are checked against Temporal.
import { Temporal } from 'temporal-polyfill'
import { expect, test } from 'vitest'
import { changeByDay, daysLeft, dwellStage } from '#app/clinical/dwell.ts'

const notice = { noticeDays: 7, strongDays: 2 }

function byTemporal(insertedOn: string, limitDays: number): string {
  return Temporal.PlainDate.from(insertedOn).add({ days: limitDays }).toString()
}

test.each([
  ['C-18', '2026-03-02', 28, '2026-03-30'],
  ['C-18', '2026-03-02', 29, '2026-03-31'],
  ['C-18', '2026-03-02', 30, '2026-04-01'],
  ['C-19', '2028-02-10', 28, '2028-03-09'],
  ['C-20', '2026-12-15', 30, '2027-01-14'],
])('%s a tube inserted on %s with a limit of %i days is to be changed by %s', (_, insertedOn, limitDays, changeBy) => {
  expect(changeByDay(insertedOn, limitDays)).toBe(changeBy)
  expect(byTemporal(insertedOn, limitDays)).toBe(changeBy)
})

test('C-21 inserted on 31-Jan-2026 with 28 days, 28-Feb is the limit day and 01-Mar a day past it', () => {
  const onLimitDay = daysLeft('2026-01-31', 28, '2026-02-28')
  const dayAfter = daysLeft('2026-01-31', 28, '2026-03-01')
  expect([onLimitDay, dwellStage(onLimitDay, notice)]).toEqual([0, 'limit day'])
  expect([dayAfter, dwellStage(dayAfter, notice)]).toEqual([-1, 'past limit'])
})

test('C-22 on 23-Mar-2026 a tube to be changed by 30-Mar has 7 days left, which is a first notice', () => {
  const left = daysLeft('2026-03-02', 28, '2026-03-23')
  expect([left, dwellStage(left, notice)]).toEqual([7, 'notice'])
})
