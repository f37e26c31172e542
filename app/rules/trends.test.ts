import { describe, expect, test } from 'vitest'
import { afterRemovals } from '../care/after-removal/schema.ts'
import { carePlans } from '../care/care-plan/schema.ts'
import { cuffChecks } from '../care/cuff-pressure/schema.ts'
import { cuffLower, cuffUpper } from '../care/cuff-pressure/settings.ts'
import type { StoredEntry } from '../care/kind.ts'
import { type AboutContext, aContext, aCorrection, anEntry, aPolicy, aRemoval, aTube, at } from '../care/make.ts'
import { calm } from '../care/observations/examples.ts'
import { observationSets } from '../care/observations/schema.ts'
import { usualCheck } from '../care/stoma-and-skin/examples.ts'
import { stomaChecks } from '../care/stoma-and-skin/schema.ts'
import { tubeChanges } from '../care/tube-change/schema.ts'
import { valveEnd, valveStart } from '../care/weaning-trial/examples.ts'
import { type StopReason, weaningTrials } from '../care/weaning-trial/schema.ts'
import type { TrendsAsked } from './trend-time.ts'
import { beyondWords, findingsWords, lengthsWords, measureWords } from './trend-words.ts'
import { type TrendView, trendsOf } from './trends.ts'

const tube = anEntry(tubeChanges, '2026-03-02 10:00', aTube())
const reading = (when: string, found: number, more: object = {}) =>
  anEntry(cuffChecks, when, { found, unit: 'cmH2O', method: 'manometer', ...more })

/** A policy of which a second version comes into force on 09-Mar at 12:00 with other numbers. */
const second = { ...aPolicy({ [cuffUpper.name]: 25 }), id: 'policy-2', version: 2, startsAt: at('2026-03-09 12:00') }

function asked(entries: readonly StoredEntry[], about: AboutContext & { readonly from?: string } = {}): TrendsAsked {
  const { record, ward, now } = aContext([tube, ...entries], '12:00', about)
  return {
    record,
    ward,
    now,
    from: at(about.from ?? '2026-03-08 00:00'),
    to: now,
    policyAt: moment => (moment >= second.startsAt ? second : aPolicy()),
    policyChangesAt: [second.startsAt],
  }
}

function viewOf<Shape extends TrendView['shape']>(shape: Shape, name: string, given: TrendsAsked) {
  const view = trendsOf(given).find(one => one.name === name && one.shape === shape)
  if (!view) throw new RangeError(`No ${shape} ${name}`)
  return view as Extract<TrendView, { shape: Shape }>
}

const cuff = (entries: readonly StoredEntry[], about: Parameters<typeof asked>[1] = {}) =>
  viewOf('measure', 'cuff-pressure', asked(entries, about))

describe('cuff pressure', () => {
  test('the band has a step where another version came into force, and where the plan of the patient did', () => {
    const plan = {
      setting: cuffLower.name,
      step: 'set own value',
      value: 18,
      reason: 'Sore',
      reviewOn: '2026-03-20',
    } as const
    const own = anEntry(carePlans, '2026-03-09 18:00', plan)
    expect(
      cuff([own]).bands.map(({ from, to, words, origin }) => [new Date(from), new Date(to), words, origin]),
    ).toEqual([
      [at('2026-03-08 00:00'), at('2026-03-09 12:00'), '20 to 30 cmH2O', 'Tracheostomy care, version 1'],
      [at('2026-03-09 12:00'), at('2026-03-09 18:00'), '20 to 25 cmH2O', 'Tracheostomy care, version 2'],
      [at('2026-03-09 18:00'), at('12:00'), '18 to 25 cmH2O', "This patient's plan: Sore"],
    ])
  })

  // The same 28 cmH2O before and after the version that ends at 25.
  test.each<[string, StoredEntry, readonly (boolean | null)[], string]>([
    ['by the version of its time', reading('2026-03-09 08:00', 28), [false, false], 'In range'],
    ['by the version after it', reading('2026-03-09 14:00', 28), [true, true], 'High'],
    ['found high and put right', reading('08:00', 34, { leftAt: 24 }), [true, false], 'Found high, left in range'],
    ['let down', reading('08:00', 0, { cuffNow: 'deflated' }), [null, null], 'Cuff down: no band applies'],
  ])('a reading is judged: %s', (_, entry, isOut, remark) => {
    const [only, ...others] = cuff([entry]).readings
    expect(others).toEqual([])
    expect(only?.values.map(value => value.isOut)).toEqual(isOut)
    expect(only?.remark).toBe(remark)
  })

  test('values, band and axis are in the unit of the ward, and a reading keeps its number', () => {
    const view = cuff([reading('08:00', 22, { unit: 'mmHg' })], { ward: { pressureUnit: 'mmHg' } })
    expect(view.unit).toBe('mmHg')
    expect(view.ticks).toEqual([0, 10, 20, 30, 40])
    expect(view.bands[0]?.words).toBe('15 to 22 mmHg')
    expect(view.readings[0]?.values[0]).toMatchObject({ value: 22, words: '22 mmHg' })
  })

  test('what was corrected, retracted, not measured or lies outside the span does not count', () => {
    const [wrong, gone] = [reading('08:00', 62), reading('09:00', 25)]
    const view = cuff([
      wrong,
      aCorrection(wrong, cuffChecks, '08:00', { found: 26, unit: 'cmH2O', method: 'manometer' }),
      gone,
      aCorrection(
        gone,
        cuffChecks,
        '09:00',
        { found: 25, unit: 'cmH2O', method: 'manometer' },
        { status: 'retracted' },
      ),
      anEntry(cuffChecks, '10:00', { unit: 'cmH2O', method: 'not measured', whyNot: 'asleep' }),
      reading('2026-03-07 23:59', 25),
    ])
    expect(view.readings.map(({ at: when, values }) => [new Date(when), values[0]?.value])).toEqual([[at('08:00'), 26]])
  })

  test('a value beyond the plot is said', () => {
    const view = cuff([reading('08:00', 62, { leftAt: 24 })])
    expect(beyondWords(view, 'Europe/London')).toEqual(['Found 62 cmH2O on 10-Mar-2026 08:00'])
    expect(measureWords(view, 'Europe/London')).toBe(
      '1 reading. Found: 1 out of range. Target 20 to 30 cmH2O from 08-Mar-2026 00:00. Target 20 to 25 cmH2O from 09-Mar-2026 12:00. Latest on 10-Mar-2026 08:00: found 62 cmH2O, left at 24 cmH2O.',
    )
  })

  test('a child whom no rules are for is drawn and not judged', () => {
    const view = cuff([reading('08:00', 34)], { patient: { bornOn: '2020-05-05' } })
    expect(view.bands).toEqual([])
    expect(view.why).toBeNull()
    expect(view.readings[0]).toMatchObject({ remark: '', values: [{ value: 34, isOut: null }, { isOut: null }] })
  })

  test('the numbers of the band now have their source', () => {
    expect(cuff([]).why?.values.map(({ label, value, origin }) => `${label}: ${value}, ${origin}`)).toEqual([
      'Cuff pressure, lower limit: 20 cmH2O, Product default',
      'Cuff pressure, upper limit: 25 cmH2O, Policy',
    ])
  })
})

test('SpO2 goes on in one plot after the tube was taken out, against what is prescribed', () => {
  const well = {
    respiratoryRate: 16,
    effort: 'easy',
    stridor: 'no',
    voice: 'clear',
    monitored: 'yes',
    spareThere: 'yes',
  } as const
  const entries = [
    anEntry(observationSets, '08:00', { ...calm, spo2: 93 }),
    aRemoval('09:00'),
    anEntry(afterRemovals, '09:15', { ...well, spo2: 96 }),
  ]
  const view = viewOf('measure', 'spo2', asked(entries, { patient: { spo2Low: 94, spo2High: 98 } }))
  expect(view.readings.map(({ values }) => [values[0]?.words, values[0]?.isOut])).toEqual([
    ['93%', true],
    ['96%', false],
  ])
  expect(view.bands.map(({ words, origin }) => `${words}. ${origin}`)).toEqual([
    '94 to 98%. Target as it is prescribed now',
  ])
})

test('without a prescribed target SpO2 is held against none', () => {
  const view = viewOf('measure', 'spo2', asked([anEntry(observationSets, '08:00', { ...calm, spo2: 88 })]))
  expect([view.bands, view.readings[0]?.values[0]?.isOut]).toEqual([[], null])
})

test('findings are the worst of each day of the ward, and days without a look are told from days without a finding', () => {
  const look = (when: string, more: object = {}) => anEntry(stomaChecks, when, { ...usualCheck, ...more })
  const view = viewOf(
    'findings',
    'stoma-and-skin',
    asked([
      look('2026-03-08 23:50', { exudate: 'scant', exudateType: 'clear' }),
      look('08:00', { exudate: 'copious', exudateType: 'cloudy', appearance: ['redness'] }),
      look('11:00', { exudate: 'scant', exudateType: 'clear' }),
    ]),
  )
  expect(view.days.map(({ day, looks, found }) => [day, looks.map(({ time }) => time), found])).toEqual([
    ['2026-03-08', ['23:50'], ['Exudate scant']],
    ['2026-03-09', [], []],
    ['2026-03-10', ['08:00', '11:00'], ['Redness', 'Exudate copious']],
  ])
  expect(view.rows.map(({ label, levels }) => [label, levels])).toEqual([
    ['Redness', [0, null, 1]],
    ['Exudate', [1, null, 3]],
  ])
  expect(view.notSeen).toContain('Pus')
  expect(findingsWords(view)).toBe(
    'Looked at on 2 of 3 days. Redness: 1 of 2 days, last 10-Mar-2026. Exudate: 2 of 2 days, last 10-Mar-2026.',
  )
})

describe('trials', () => {
  const trial = (from: string, to: string | null, reasons: StopReason[] = ['planned']) => [
    anEntry(weaningTrials, from, valveStart),
    ...(to === null ? [] : [anEntry(weaningTrials, to, { ...valveEnd, reasons })]),
  ]
  const lengths = (entries: readonly StoredEntry[], about: Parameters<typeof asked>[1] = {}) =>
    viewOf('lengths', 'weaning-trials', asked(entries, about))

  test.each<[string, readonly StoredEntry[], string]>([
    ['passed', trial('2026-03-08 08:00', '2026-03-08 20:00'), 'reached 720 Passed: As planned'],
    ['stopped early', trial('08:00', '11:00'), 'short 180 Stopped early: As planned'],
    ['failed', trial('08:00', '09:00', ['stridor', 'saturation']), 'failed 60 Failed: Stridor, SpO2'],
    ['running', trial('10:30', null), 'running 90 Running: '],
    [
      'ended with the tube',
      [...trial('08:00', null), aRemoval('09:30')],
      'short 90 Stopped early: The tube was changed or came out',
    ],
  ])('a trial that was %s', (_, entries, expected) => {
    const [group] = lengths(entries).groups
    expect(group?.lengths.map(one => `${one.end} ${one.length / 60_000} ${one.verdict}: ${one.because}`)).toEqual([
      expected,
    ])
  })

  test('one that reaches into the span is drawn whole, one that ended before it is not', () => {
    const before = trial('2026-03-06 08:00', '2026-03-06 20:00')
    const into = trial('2026-03-07 20:00', '2026-03-08 08:00')
    const view = lengths([...before, ...into])
    expect(view.groups.map(({ label, lengths: all }) => [label, all.length])).toEqual([['One-way valve', 1]])
    expect(lengthsWords(view)).toBe('One-way valve: 1 passed; latest 12 h.')
  })

  test('a child whom no rules are for has lengths and no verdicts', () => {
    const view = lengths(trial('08:00', '09:00', ['stridor']), { patient: { bornOn: '2020-05-05' } })
    expect(view.groups[0]?.lengths).toMatchObject([
      { target: null, end: 'not judged', verdict: 'Ended', because: 'Stridor' },
    ])
  })
})

test('an empty record gives every trend, with nothing in it', () => {
  const views = trendsOf(asked([]))
  expect(views.map(({ title }) => title)).toEqual([
    'Cuff pressure',
    'Secretion sum',
    'SpO2',
    'Stoma and skin',
    'Weaning trials',
  ])
  expect(views.flatMap(view => (view.shape === 'measure' ? view.readings : []))).toEqual([])
})
