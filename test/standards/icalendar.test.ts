import fc from 'fast-check'
import ICAL from 'ical.js'
import { expect, test } from 'vitest'
import { icalendar } from '#app/time/icalendar.ts'

/* The calendar file against RFC 5545, as the library ical.js reads it, and by its own words where the library is lenient. */

const madeAt = new Date('2026-03-10T14:06:30.500Z')
const day = { uid: 'tube-1-change-by@ward', on: '2026-03-31', title: 'A3 MT: change by', text: 'Day 26 of 28' }

function eventsOf(file: string) {
  const calendar = new ICAL.Component(ICAL.parse(file))
  return calendar.getAllSubcomponents('vevent').map(event => new ICAL.Event(event))
}

test('a whole day is read as that day, with its stamp', () => {
  const [event] = eventsOf(icalendar('Tubes', [day], madeAt))
  expect(event?.startDate.isDate).toBe(true)
  expect([event?.startDate.toString(), event?.endDate.toString()]).toEqual(['2026-03-31', '2026-04-01'])
  expect([event?.uid, event?.summary, event?.description]).toEqual([day.uid, day.title, day.text])
  expect(event?.component.getFirstPropertyValue('dtstamp')?.toString()).toBe('2026-03-10T14:06:30Z')
})

test('an empty calendar is a calendar', () => {
  expect(eventsOf(icalendar('Tubes', [], madeAt))).toEqual([])
})

// The RFC takes every character but controls; half of a pair of surrogates is no character.
const words = fc.string({ unit: 'grapheme', maxLength: 200 }).map(text => text.replaceAll(/\p{Cc}|\p{Cs}/gu, ' '))

test('any words come back as they were, in lines of at most 75 octets that end in CRLF', () => {
  fc.assert(
    fc.property(words, words, (title, text) => {
      const file = icalendar(title, [{ ...day, title, text: `${text}\nsecond line` }], madeAt)
      const [event] = eventsOf(file)
      expect(event?.summary).toBe(title)
      expect(event?.description).toBe(`${text}\nsecond line`)
      expect(file.endsWith('\r\n')).toBe(true)
      for (const line of file.split('\r\n')) {
        expect(new TextEncoder().encode(line).length).toBeLessThanOrEqual(75)
        expect(line).not.toMatch(/[\r\n]/)
      }
    }),
    { numRuns: 200 },
  )
})
