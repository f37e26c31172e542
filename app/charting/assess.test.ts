import { expect, test } from 'vitest'
import { cuffPressure } from '../care/cuff-pressure/kind.ts'
import { aContext, anEntry, aTube, at } from '../care/make.ts'
import { tubeChange } from '../care/tube-change/kind.ts'
import { assessed, type Situation } from './assess.ts'

const situation: Situation = {
  calendar: { zone: 'Europe/London', now: at('14:06'), beganAt: at('2026-03-01 08:00'), endedAt: null },
  known: { settings: [], tasks: [] },
  item: null,
  reason: 'when late',
  witnessIds: new Set(),
  contextAt: when => aContext([anEntry(tubeChange, '2026-03-02 09:00', aTube())], when),
}

const whole = {
  id: '01939d4e-0000-7000-8000-000000000001',
  openedBy: '01939d4e-0000-7000-8000-000000000002',
  at: '2026-03-10T14:06:00.000Z',
  when: 'now',
  'care.found': '26',
  'care.unit': 'cmH2O',
  'care.method': 'manometer',
}

function form(
  changes: Readonly<Record<string, string | undefined>> = {},
  more: readonly [string, string][] = [],
): FormData {
  const sent = new FormData()
  for (const [name, value] of [...Object.entries({ ...whole, ...changes }), ...more]) {
    if (value !== undefined) sent.append(name, value)
  }
  return sent
}

const errorsOf = (sent: FormData, about: Partial<Situation> = {}) => {
  const answer = assessed(cuffPressure, sent, { ...situation, ...about })
  return answer.ok ? {} : answer.errors
}

test('a whole form is charted as it says', () => {
  expect(assessed(cuffPressure, form(), situation)).toMatchObject({
    ok: true,
    chart: { id: whole.id, performedAt: at('14:06'), care: { found: 26, unit: 'cmH2O', method: 'manometer' } },
  })
})

test('a decimal comma is a decimal point', () => {
  const answer = assessed(cuffPressure, form({ 'care.found': '26,5' }), situation)
  expect(answer).toMatchObject({ ok: true, chart: { care: { found: 26.5 } } })
})

test('a mistake in the care and one in the time are said together', () => {
  const sent = form({ 'care.method': undefined, when: 'other', day: '2026-03-11', time: '09:00' })
  expect(errorsOf(sent)).toEqual({
    'care.method': ['Choose the method'],
    time: [expect.stringMatching(/not come yet/)],
  })
})

test.each([
  ['an unknown field', 'care.pressure'],
  ['a field of the prototype', 'care.__proto__.polluted'],
  ['the constructor', 'care.constructor.prototype.x'],
  ['an index past any list', 'care[4294967295]'],
  ['a broken path', 'care..['],
  ['the form library’s own state', '__state__'],
  ['its intent', '__intent__'],
])('refuses %s by name', (_case, name) => {
  expect(errorsOf(form({}, [[name, '{"type":"reset"']]))).toEqual({
    '': [expect.stringMatching(/do not belong to it/)],
  })
  expect(({} as Record<string, unknown>).polluted).toBeUndefined()
})

test('a field that is sent twice is a mistake of that field', () => {
  expect(Object.keys(errorsOf(form({}, [['care.found', '27']])) ?? {})).toEqual(['care.found'])
  expect(Object.keys(errorsOf(form({}, [['id', whole.id]])) ?? {})).toContain('id')
})

test('a file in place of a value is refused', () => {
  const sent = form({ 'care.note': undefined })
  sent.append('care.note', new File(['x'], 'note.txt'))
  expect(errorsOf(sent)).toEqual({ '': [expect.stringMatching(/care.note/)] })
})

test('what is written more than a day late needs a reason', () => {
  const late = { when: 'other', day: '2026-03-09', time: '14:05' }
  expect(errorsOf(form(late))).toEqual({ reason: ['Enter why this is written more than 24 h late'] })
  expect(errorsOf(form({ ...late, time: '14:06' }))).toEqual({})
  expect(errorsOf(form({ ...late, reason: '  ' }))).toHaveProperty('reason')
  expect(assessed(cuffPressure, form({ ...late, reason: 'Was on paper' }), situation)).toMatchObject({
    ok: true,
    chart: { reason: 'Was on paper' },
  })
})

test('a correction always needs a reason', () => {
  expect(errorsOf(form(), { reason: 'always' })).toEqual({ reason: ['Enter why the entry is corrected'] })
})
