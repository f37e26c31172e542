import { expect, test } from 'vitest'
import { freeNote } from '../care/free-note/kind.ts'
import { aContext, anEntry, at } from '../care/make.ts'
import { recordOverTime } from './record-over-time.ts'

const note = (when: string) => anEntry(freeNote, when, { words: `At ${when}` })
const over = () => recordOverTime(aContext([note('08:00'), note('09:00'), note('11:00')], '12:00').record)

test.each([
  ['07:59', []],
  ['08:00', ['At 08:00']],
  ['10:00', ['At 09:00', 'At 08:00']],
  ['12:00', ['At 11:00', 'At 09:00', 'At 08:00']],
])('at %s the record holds what had been done by then, latest first', (when, words) => {
  const record = over().at(at(when))
  expect(record.of(freeNote).map(({ data }) => data.words)).toEqual(words)
  expect(record.latest(freeNote)?.data.words).toBe(words[0])
  expect(record.since(freeNote, at('08:30'))).toHaveLength(words.filter(word => word > 'At 08:30').length)
})

test('the next change is the next entry of a kind that was asked for', () => {
  const record = over()
  expect(record.nextChange(at('08:30').getTime())).toBe(Number.POSITIVE_INFINITY)
  record.at(at('08:30')).of(freeNote)
  expect(record.nextChange(at('08:30').getTime())).toBe(at('09:00').getTime())
  expect(record.nextChange(at('11:00').getTime())).toBe(Number.POSITIVE_INFINITY)
  record.forget()
  expect(record.nextChange(at('08:30').getTime())).toBe(Number.POSITIVE_INFINITY)
})

test('going over the same time again cuts nothing anew', () => {
  const record = over()
  const first = ['08:00', '10:00', '12:00'].map(when => record.at(at(when)).of(freeNote))
  const second = ['08:59', '10:59', '23:00'].map(when => record.at(at(when)).of(freeNote))
  expect(second.map((entries, i) => entries === first[i])).toEqual([true, true, true])
})

test('a move is a change, and no part of the record before it', () => {
  const moves = [{ at: at('09:30'), bed: 'A4', ward: null }]
  const record = recordOverTime(aContext([note('08:00')], '12:00', { moves }).record)
  expect(record.nextChange(at('08:30').getTime())).toBe(at('09:30').getTime())
  expect(record.at(at('09:29')).moves).toEqual([])
  expect(record.at(at('09:30')).moves).toEqual(moves)
  expect(record.nextChange(at('09:30').getTime())).toBe(Number.POSITIVE_INFINITY)
})
