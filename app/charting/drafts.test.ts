import { expect, test } from 'vitest'
import { cuffPressure } from '../care/cuff-pressure/kind.ts'
import { restored } from './drafts.ts'

const draft = {
  id: ['01939d4e-0000-7000-8000-000000000001'],
  openedBy: ['01939d4e-0000-7000-8000-000000000002'],
  at: ['2026-03-10T14:06:30.000Z'],
  when: ['now'],
  'care.found': ['26'],
  'care.strange': ['x'],
}

test('what was "now" when it was typed is a time of its own when it comes back', () => {
  expect(restored(cuffPressure, draft, 'Europe/London')).toEqual({
    when: ['other'],
    day: ['2026-03-10'],
    time: ['14:06'],
    'care.found': ['26'],
  })
})

test('a time that was typed comes back as it was typed', () => {
  const typed = { ...draft, when: ['other'], day: ['2026-03-09'], time: ['9'] }
  expect(restored(cuffPressure, typed, 'Europe/London')).toMatchObject({ day: ['2026-03-09'], time: ['9'] })
})
