import { addDays, type LocalDay } from './zone.ts'

/** One whole day in a calendar. `uid` stays the same for the same thing, so that a program moves it instead of adding one. */
export interface CalendarDay {
  readonly uid: string
  readonly on: LocalDay
  readonly title: string
  readonly text: string
}

const CRLF = '\r\n'
const MOST_OCTETS = 75 // RFC 5545, 3.1: longer lines are folded

/** A calendar as a file (RFC 5545): whole days, folded lines, CRLF. `madeAt` stamps every event. */
export function icalendar(name: string, days: readonly CalendarDay[], madeAt: Date): string {
  const lines = [
    'BEGIN:VCALENDAR',
    'VERSION:2.0',
    'PRODID:-//Cannulary//Tube changes//EN',
    'CALSCALE:GREGORIAN',
    'METHOD:PUBLISH',
    `X-WR-CALNAME:${escaped(name)}`,
    ...days.flatMap(day => eventLines(day, madeAt)),
    'END:VCALENDAR',
  ]
  return lines.map(folded).join(CRLF) + CRLF
}

function eventLines({ uid, on, title, text }: CalendarDay, madeAt: Date): readonly string[] {
  return [
    'BEGIN:VEVENT',
    `UID:${escaped(uid)}`,
    `DTSTAMP:${madeAt.toISOString().slice(0, 19).replaceAll(/[-:]/g, '')}Z`,
    `DTSTART;VALUE=DATE:${plain(on)}`,
    // The end of a whole day is the day after it (RFC 5545, 3.6.1).
    `DTEND;VALUE=DATE:${plain(addDays(on, 1))}`,
    `SUMMARY:${escaped(title)}`,
    `DESCRIPTION:${escaped(text)}`,
    'TRANSP:TRANSPARENT',
    'END:VEVENT',
  ]
}

const plain = (day: LocalDay): string => day.replaceAll('-', '')

/** Text of a property: backslash, semicolon, comma and line breaks are escaped (RFC 5545, 3.3.11); other control characters go. */
function escaped(text: string): string {
  return text
    .replaceAll(/[\\;,]/g, '\\$&')
    .replaceAll(/\r\n|[\r\n]/g, '\\n')
    .replaceAll(/\p{Cc}/gu, '')
}

/** A line of at most 75 octets, continued after CRLF and a space; never cut within a character. */
function folded(line: string): string {
  const parts: string[] = []
  let part = ''
  let octets = 0
  for (const character of line) {
    const size = octetsOf(character)
    if (octets + size > MOST_OCTETS) {
      parts.push(part)
      part = ' '
      octets = 1
    }
    part += character
    octets += size
  }
  return [...parts, part].join(CRLF)
}

function octetsOf(character: string): number {
  const code = character.codePointAt(0) ?? 0
  return code < 0x80 ? 1 : code < 0x800 ? 2 : code < 0x10000 ? 3 : 4
}
