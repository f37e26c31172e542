import { z } from 'zod'
import type { EmergencyNumber } from '../care/emergency.ts'

const MOST_NUMBERS = 6
const LONGEST_WHO = 40
const LONGEST_NUMBER = 30

/** One line of the form: `Airway team: 2222`. */
const LINE = /^(?<who>[^:\p{Cc}\p{Cs}]+):\s*(?<number>[0-9+*#(][0-9A-Za-z+*#()\-/ ]*)$/u

/** Whom a ward calls, one a line as `Airway team: 2222`, as a list. Nothing typed is an empty list. */
export const emergencyNumbers = z
  .string('Enter the numbers one a line')
  .max(1000, 'Enter shorter lines')
  .optional()
  .transform((words = '') => words.split(/\r?\n/).flatMap(line => (line.trim() === '' ? [] : [line.trim()])))
  .superRefine((lines, context) => {
    const says = problemOf(lines)
    if (says !== undefined) context.addIssue({ code: 'custom', message: says })
  })
  .transform(lines => lines.map(numberOf))

/** The list as it is typed into the form. */
export function numbersText(numbers: readonly EmergencyNumber[]): string {
  return numbers.map(({ who, number }) => `${who}: ${number}`).join('\n')
}

function numberOf(line: string): EmergencyNumber {
  const { who = '', number = '' } = LINE.exec(line)?.groups ?? {}
  return { who: who.trim(), number: number.trim() }
}

function problemOf(lines: readonly string[]): string | undefined {
  if (lines.length > MOST_NUMBERS) return `Enter at most ${MOST_NUMBERS} numbers: a sign has no room for more`
  for (const line of lines) {
    const { who, number } = numberOf(line)
    const shown = line.slice(0, LONGEST_WHO)
    if (who === '' || number === '')
      return `Write "${shown}" as a name, a colon and a number, such as Airway team: 2222`
    if (who.length > LONGEST_WHO) return `Shorten "${shown}" to ${LONGEST_WHO} characters before the colon`
    if (number.length > LONGEST_NUMBER) return `Shorten the number of "${who}" to ${LONGEST_NUMBER} characters`
  }
  return undefined
}
