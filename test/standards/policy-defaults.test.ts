import { expect, test } from 'vitest'
import { settingsOf } from '#app/care/children.ts'
import { careSettings } from '#app/care/kinds.ts'
import type { Standing } from '#app/care/policy.ts'
import { policyDifferences, policyProblems } from '#app/rules/policy-values.ts'

/*
 * Every number of a policy as the clinical reference gives it: its default, how far that was checked, and words of its source.
 * V read at its source, V2 read second-hand, M from memory or common practice, P our own proposal, to be signed off by the hospital.
 * A new setting needs a row here; a default that changes must change here too, with its reason.
 */

type Mark = 'V' | 'V2' | 'M' | 'P'
type Row = readonly [name: string, value: number | boolean | readonly number[], mark: Mark, source: string]

const rows: readonly Row[] = [
  // Inner cannula (reference 3.1)
  ['inner-cannula-inspection-interval', 8, 'V2', 'at least once in 8 hours'],
  ['inner-cannula-early-interval', 4, 'P', 'No published number'],
  ['inner-cannula-early-period', 48, 'P', 'No published number'],
  ['inner-cannula-disposable-interval', 12, 'M', 'Twice a day'],
  ['inner-cannula-reusable-interval', 24, 'M', 'At least once a day'],
  ['inner-cannula-recheck', 2, 'P', 'as a recheck a proposal'],
  ['inner-cannula-repeat-block-window', 24, 'P', 'without a number'],
  ['inner-cannula-cleaning-within', 60, 'P', 'the minutes are a proposal'],
  // Cuff (3.2, 4.1)
  ['cuff-pressure-lower-limit', 20, 'V', 'Lizy 2014'],
  ['cuff-pressure-upper-limit', 30, 'V', 'BMJ 1984'],
  ['cuff-pressure-very-low', 15, 'P', 'Lowest published lower limit'],
  ['cuff-pressure-very-high', 40, 'P', 'near 50 cmH2O'],
  ['cuff-pressure-interval', 8, 'V', 'every 8 hours no worse than every 4 hours'],
  ['cuff-pressure-event-check', 15, 'P', 'the minutes are a proposal'],
  ['cuff-pressure-recheck', 30, 'P', 'No published number'],
  ['cuff-top-ups', 2, 'P', 'without a number'],
  ['cuff-top-up-volume', 3, 'P', 'without a number'],
  ['cuff-top-up-window', 12, 'P', 'without a number'],
  ['water-cuff-difference', 1, 'P', 'No published number'],
  // Stoma, skin and ties (3.4 to 3.6, 4.6)
  ['dressing-change-interval', 24, 'V', 'Royal Marsden Manual'],
  ['ties-most-fingers', 2, 'V', 'one to two'],
  ['ties-change-interval', 24, 'M', 'daily in many hospital policies'],
  ['stoma-infection-signs', 2, 'P', 'No validated score'],
  // Suction (3.7, 4.3, 5.2)
  ['suction-need-interval', 4, 'P', 'the hours are a proposal'],
  ['suction-need-interval-copious', 2, 'P', 'the hours are a proposal'],
  ['suction-catheter-share', 50, 'V', 'Vanner and Bick 2008'],
  ['suction-catheter-strictly-below', false, 'V', 'AARC 2010'],
  ['suction-catheter-sizes', [5, 6, 8, 10, 12, 14, 16, 18], 'M', 'common use'],
  ['suction-depth-past-tip', 5, 'V', 'length of the tube and 0.5 cm'],
  ['suction-vacuum-low', 80, 'V', '80 to 150 mmHg'],
  ['suction-vacuum-warn', 150, 'V', '80 to 150 mmHg'],
  ['suction-vacuum-very-high', 200, 'V', 'below 200 mmHg'],
  ['suction-vacuum-unit-doubt', 40, 'P', 'the number lies between'],
  ['suction-pass-warn', 10, 'M', 'at most 10 seconds'],
  ['suction-pass-limit', 15, 'V', 'at most 15 seconds'],
  ['suction-most-passes', 3, 'M', 'at most 3'],
  ['suction-spo2-below-target', 3, 'V', 'BTS oxygen guideline 2017'],
  ['suction-spo2-without-target', 91, 'V', 'NEWS2'],
  ['bleed-window-from', 3, 'V', '3 days to 6 weeks'],
  ['bleed-window-to', 42, 'V', '3 days to 6 weeks'],
  ['bleed-streaks-red', false, 'P', 'doctor this shift'],
  ['bleed-watch', 48, 'P', 'the hours are a proposal'],
  // Above the cuff, humidity, mouth, kit (3.8 to 3.10, 3.12)
  ['above-cuff-suction-interval', 4, 'M', 'every 1 to 4 hours'],
  ['above-cuff-rate-limit', 1, 'V', 'Pryor 2016'],
  ['hme-change-interval', 24, 'V', "St George's NHS"],
  ['humidifier-water-interval', 4, 'P', 'No published number'],
  ['oral-care-interval', 4, 'M', 'every 2 to 4 hours'],
  ['tooth-brushing-interval', 12, 'V', 'twice a day'],
  ['bedside-kit-after-event', 30, 'P', 'the minutes are a proposal'],
  ['bedside-kit-missing-within', 15, 'P', 'No published number'],
  // Weaning, cough, removal (4.5, 4.8)
  ['trial-target-cuff', 24, 'V', '24 hours'],
  ['trial-target-valve', 12, 'V', '12 hours by day'],
  ['trial-target-cap', 24, 'V', 'NEJM 2020'],
  ['trial-observations-early', 15, 'P', 'No published number'],
  ['trial-early-period', 60, 'P', 'No published number'],
  ['trial-observations-interval', 60, 'P', 'No published number'],
  ['trial-stop-respiratory-rate', 30, 'P', 'No published number'],
  ['trial-stop-respiratory-rate-rise', 50, 'P', 'No published number'],
  ['trial-stop-spo2-fall', 3, 'V', 'BTS oxygen guideline 2017'],
  ['trial-stop-heart-rate-rise', 20, 'P', 'No published number'],
  ['weaning-fio2-at-most', 40, 'V', 'Pryor 2016'],
  ['cough-flow-mouth', 160, 'V', 'Winck 2015'],
  ['cough-flow-valve', 100, 'V', '2 failed within 48 hours'],
  ['cough-flow-tube', 60, 'V', 'not a true cough'],
  ['cough-flow-retention', 270, 'V', 'Review of 2022'],
  ['failed-removal-window', 48, 'V', 'Stelfox 2008'],
  ['after-removal-schedule', [15, 30, 45, 60, 90, 120, 180, 240, 300, 360], 'P', 'is a proposal'],
  ['after-removal-interval', 4, 'P', 'No published number'],
  ['after-removal-period', 48, 'V2', '24 to 48 hours'],
  ['after-removal-monitored', 24, 'M', 'first 24 hours'],
  ['opening-review-interval', 24, 'V2', '5 to 7 days'],
  // Observations (3.13, 4.7)
  ['observations-interval', 4, 'M', 'early-warning policy'],
  ['observations-spo2-fall', 3, 'V', 'BTS oxygen guideline 2017'],
  ['observations-respiratory-rate-low', 8, 'V', '8 or less'],
  ['observations-respiratory-rate-high', 25, 'V', '25 or more'],
  ['observations-heart-rate-low', 40, 'V', '40 or less'],
  ['observations-heart-rate-high', 131, 'V', '131 or more'],
  ['observations-systolic-low', 90, 'V', '90 or less'],
  ['observations-systolic-high', 220, 'V', '220 or more'],
  ['observations-spo2-low-scale-2', 83, 'V', '83% or less'],
  // Tube change, sutures, tract (3.11, 2.4)
  ['dwell-limit-dual-cannula', 28, 'V', 'National Tracheostomy Safety Project'],
  ['dwell-limit-single-cannula', 14, 'V2', '7 to 14 days'],
  ['dwell-limit-single-cannula-heavy-secretions', 7, 'V2', '7 to 14 days'],
  ['heavy-secretions-after', 3, 'P', 'No published number'],
  ['dwell-notice', 7, 'P', 'No published number'],
  ['dwell-strong-notice', 2, 'P', 'No published number'],
  ['first-change-surgical-earliest', 4, 'V2', 'not before day 4'],
  ['first-change-surgical-target', 7, 'V2', 'day 3 to 7'],
  ['first-change-percutaneous-earliest', 7, 'V', 'White 2010'],
  ['first-change-percutaneous-target', 10, 'V', 'day 10 to 14'],
  ['first-change-hard-limit', 72, 'V2', 'not in the first 72 hours'],
  ['routine-first-change', true, 'V2', 'French expert panel 2018'],
  ['sutures-out-by', 7, 'V', "O'Toole 2017"],
  ['tract-established-after', 14, 'V', 'Saskatoon'],
  ['no-blind-reinsertion-before', 7, 'V', 'Bontempo and Manning'],
  ['repeat-tube-out-window', 7, 'P', 'No published number'],
  ['after-removal-watch', 48, 'P', 'Stelfox 2008'],
  // Care plan (10)
  ['care-plan-review-notice', 2, 'P', 'No published number'],
  // When care is late (3.0): no guideline gives grace minutes; ISMP 2011 adopted
  ['lateness-short-tolerance', 25, 'P', 'ISMP 2011'],
  ['lateness-short-soon', 25, 'P', 'ISMP 2011'],
  ['lateness-short-serious', 100, 'P', 'No published number'],
  ['lateness-middle-tolerance', 60, 'P', 'ISMP 2011'],
  ['lateness-middle-soon', 60, 'P', 'ISMP 2011'],
  ['lateness-middle-serious', 240, 'P', 'No published number'],
  ['lateness-long-tolerance', 2, 'P', 'ISMP 2011'],
  ['lateness-long-soon', 4, 'P', 'No published number'],
  ['lateness-long-serious', 12, 'P', 'No published number'],
  ['lateness-event-serious', 60, 'P', 'No published number'],
  ['lateness-day-serious', 1, 'P', 'No published number'],
  // Charting (scope, 10)
  ['adult-age', 16, 'P', 'Local cut-off'],
  ['late-entry-after', 60, 'P', 'NMC Code section 10'],
  ['late-entry-reason-after', 24, 'P', 'no number given'],
  ['fresh-sign-in', 10, 'P', 'no number given'],
  ['second-person-signs', true, 'P', 'local rule'],
  // Staff competence (7.4)
  ['competence-months', 12, 'P', 'no published number'],
  ['competence-notice', 30, 'P', 'no published number'],
  ['competence-shift-days', 7, 'P', 'No published number'],
  // Supplies (7.2)
  ['supply-wastage', 20, 'P', 'no published share'],
  ['supply-lead-days', 3, 'P', 'those of the own store'],
  ['supply-safety-days', 7, 'P', 'no published number'],
  ['supply-horizon', 28, 'P', '28 days is a proposal'],
  ['supply-rate-days', 14, 'P', 'No published number'],
  ['supply-least-days', 3, 'P', 'No published number'],
  // Life of warnings (5.1)
  ['red-warning-seen-within', 1, 'P', 'no published number'],
  ['amber-warning-seen-within', 15, 'P', 'no published number'],
  ['warning-answer-holds', 24, 'P', 'Once a day'],
]

const standings: Readonly<Record<Mark, readonly Standing[]>> = {
  V: ['published'],
  V2: ['published, read second-hand'],
  M: ['common practice', 'from memory'],
  P: ['product proposal'],
}

test('every setting has a row, and every row a setting, each once', () => {
  expect(rows.map(([name]) => name).toSorted()).toEqual(careSettings.map(({ name }) => name).toSorted())
})

test.each(rows)('%s is %s (%s), by a source that says "%s"', (name, value, mark, words) => {
  const setting = careSettings.find(one => one.name === name)
  expect(setting?.default).toEqual(value)
  expect(standings[mark]).toContain(setting?.source.standing)
  expect(setting?.source.says).toContain(words)
})

/* The rule set for children: what differs from that for adults (reference; observations from memory). */
const forChildren: readonly Row[] = [
  ['suction-vacuum-low.neonate', 60, 'V', 'newborn 60 to 80'],
  ['suction-vacuum-warn.neonate', 80, 'V', 'newborn 60 to 80'],
  ['suction-vacuum-low.infant', 80, 'V', 'infant 80 to 100'],
  ['suction-vacuum-warn.infant', 100, 'V', 'infant 80 to 100'],
  ['suction-vacuum-low.child', 80, 'V', 'child 80 to 100'],
  ['suction-vacuum-warn.child', 100, 'V', 'child 80 to 100'],
  ['suction-vacuum-low.adolescent', 80, 'V', 'adolescent 80 to 120'],
  ['suction-vacuum-warn.adolescent', 120, 'V', 'adolescent 80 to 120'],
  ['suction-vacuum-very-high.child', 120, 'V', 'below 120 mmHg'],
  ['suction-catheter-share.neonate', 70, 'V', 'below 70% in infants'],
  ['suction-catheter-share.child', 50, 'V', 'below 50% in children'],
  ['dwell-limit-dual-cannula', 7, 'V', 'every 1 to 2 weeks'],
  ['dwell-limit-single-cannula', 7, 'V', 'every 1 to 2 weeks'],
  ['first-change-surgical-earliest', 3, 'V', 'day 3'],
  ['observations-respiratory-rate-high.infant', 60, 'M', 'paediatric life support'],
  ['observations-systolic-low.child', 80, 'M', 'paediatric advanced life support'],
]

const childSettings = settingsOf('children', careSettings)

test.each(forChildren)('for children %s is %s (%s), by a source that says "%s"', (name, value, mark, words) => {
  const setting = childSettings.find(one => one.name === name)
  expect(setting?.default).toEqual(value)
  expect(standings[mark]).toContain(setting?.source.standing)
  expect(setting?.source.says).toContain(words)
})

test('a number carried over from adults says so, and is a proposal', () => {
  const adults = new Map(careSettings.map(setting => [setting.name, setting]))
  const own = careSettings.filter(({ children }) => children !== undefined).map(({ name }) => name)
  for (const { name, source } of childSettings) {
    const plain = adults.get(name.split('.')[0] ?? '')
    if (plain && own.includes(plain.name)) continue
    expect(source.says).toMatch(/^Carried over from the rules for adults: /)
    expect(source.standing).toBe('product proposal')
  }
})

test('the defaults of both rule sets fit together', () => {
  expect(policyProblems('adults', {})).toEqual([])
  expect(policyProblems('children', {})).toEqual([])
})

test('every difference reads in words', () => {
  const says = policyDifferences('adults', {}, { 'cuff-pressure-interval': 6 }).map(
    ({ label, says }) => `${label} ${says}`,
  )
  expect(says).toEqual(['Cuff pressure check every from 8 h to 6 h'])
  expect(policyProblems('adults', { 'cuff-pressure-lower-limit': 25, 'cuff-pressure-upper-limit': 25 })).toEqual([
    '"Cuff pressure, lower limit" (25 cmH2O) must be below "Cuff pressure, upper limit" (25 cmH2O)',
  ])
  expect(policyProblems('adults', { 'cuff-pressure-interval': 24 })).toEqual([
    'Cuff pressure check every: Enter a number from 4 to 12 h',
  ])
})
