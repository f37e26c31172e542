import { expect, test } from 'vitest'
import { cuffPressure } from '../care/cuff-pressure/kind.ts'
import { at } from '../care/make.ts'
import type { Calendar } from './performed-at.ts'
import { liveSentence } from './sentence.ts'

const calendar: Calendar = { zone: 'Europe/London', now: at('14:06'), beganAt: at('2026-03-01 08:00'), endedAt: null }
const signer = { name: 'R. Osei', role: 'respiratory therapist' }

const form = (fields: Readonly<Record<string, string>>): FormData => {
  const sent = new FormData()
  const whole = {
    id: '01939d4e-0000-7000-8000-000000000001',
    openedBy: '01939d4e-0000-7000-8000-000000000002',
    at: '2026-03-10T14:06:30.000Z',
    when: 'now',
    ...fields,
  }
  for (const [name, value] of Object.entries(whole)) sent.append(name, value)
  return sent
}

const answers = { 'care.found': '34', 'care.unit': 'cmH2O', 'care.leftAt': '26', 'care.method': 'manometer' }
const says = (fields: Readonly<Record<string, string>>) => liveSentence(cuffPressure, form(fields), signer, calendar)

test('a whole form says what will be charted, when and by whom', () => {
  expect(says(answers)).toEqual({
    ready: true,
    says: '14:06 Cuff pressure 34, lowered to 26 cmH2O, by manometer. R. Osei, respiratory therapist.',
  })
})

test('care of another day is said with its day', () => {
  expect(says({ ...answers, when: 'other', day: '2026-03-09', time: '23:50' })).toMatchObject({
    says: expect.stringMatching(/^09-Mar-2026 23:50 Cuff pressure/),
  })
})

test('an empty form says what it needs, the number first', () => {
  expect(says({ 'care.unit': 'cmH2O' })).toEqual({ ready: false, needed: ['pressure found', 'method'] })
})

test('what an answer asks for is needed then', () => {
  expect(says({ 'care.unit': 'cmH2O', 'care.method': 'not measured' })).toEqual({
    ready: false,
    needed: ['reason it was not measured'],
  })
})

test.each([
  ['a number out of its range', { 'care.found': '340' }, 'Pressure found must be from 0 to 120'],
  ['a time that is to come', { when: 'other', day: '2026-03-10', time: '15:00' }, /has not come yet/],
  ['a time that is none', { when: 'other', day: '2026-03-10', time: '25:00' }, /hours and minutes/],
])('says what is wrong with %s', (_case, fields, wrong) => {
  expect(says({ ...answers, ...fields })).toMatchObject({ ready: false, wrong: expect.stringMatching(wrong) })
})
