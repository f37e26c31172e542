import type { LocalDay } from '../time/zone.ts'
import { labelDate } from './gs1-dates.ts'
import { hasCheckDigit } from './gs1-gtin.ts'

/** What stands wrong in a value: how many characters into it, and words that finish "The lot (10) ...". */
export interface Gs1Fault {
  readonly offset: number
  readonly says: string
}

interface Shape {
  readonly least: number
  readonly most: number
  /** How many characters from the left must be digits. */
  readonly digits: number
}

const digits = (most: number, least = most): Shape => ({ least, most, digits: most })
const text = (most: number, least = 1): Shape => ({ least, most, digits: 0 })
const digitsThenText = (first: number, most: number, least = first): Shape => ({ least, most, digits: first })

/**
 * Every application identifier in use and how long its value may be (GS1 Barcode Syntax Dictionary). We read five of them; the others
 * are known so that they can be stepped over. 718 and 719 are kept free there for national numbers to come.
 */
const shapes: readonly (readonly [RegExp, Shape])[] = [
  [/^00$/, digits(18)],
  [/^0[123]$/, digits(14)],
  [/^1[1-35-7]$/, digits(6)],
  [/^20$/, digits(2)],
  [/^(10|21|22|243|254|420|4318|702[0-2]|71\d|7240|8002|8012)$/, text(20)],
  [/^235$/, text(28)],
  [/^(24[01]|25[01]|40[013]|4308|4319|7002|7023|8004|8010|90)$/, text(30)],
  [/^242$/, digits(6, 1)],
  [/^253$/, digitsThenText(13, 30)],
  [/^255$/, digits(25, 13)],
  [/^3[07]$/, digits(8, 1)],
  [/^(3[246]\d|31[0-6]|33[0-7]|35[0-7]|395)[0-5]$/, digits(6)],
  [/^39[02]\d$/, digits(15, 1)],
  [/^39[13]\d$/, digits(18, 4)],
  [/^(394[0-3]|8111)$/, digits(4)],
  [/^402$/, digits(17)],
  [/^41[0-7]$/, digits(13)],
  [/^421$/, digitsThenText(3, 12, 4)],
  [/^42[246]$/, digits(3)],
  [/^42[35]$/, digits(15, 3)],
  [/^(427|7008)$/, text(3)],
  [/^(43[01][01]|4320)$/, text(35)],
  [/^43[01][2-6]$/, text(70)],
  [/^43[01]7$/, text(2, 2)],
  [/^4309$/, digits(20)],
  [/^(432[1-3]|7252)$/, digits(1)],
  [/^(432[45]|7003)$/, digits(10)],
  [/^(4326|7006|8005)$/, digits(6)],
  [/^433[0-3]$/, digitsThenText(6, 7)],
  [/^7001$/, digits(13)],
  [/^7004$/, digits(4, 1)],
  [/^7005$/, text(12)],
  [/^7007$/, digits(12, 6)],
  [/^(7009|7255)$/, text(10)],
  [/^7010$/, text(2)],
  [/^7011$/, digits(10, 6)],
  [/^703\d$/, digitsThenText(3, 30, 4)],
  [/^7040$/, digitsThenText(1, 4, 4)],
  [/^7041$/, text(4)],
  [/^723\d$/, text(30, 3)],
  [/^7241$/, digits(2)],
  [/^(7242|801[34]|8020)$/, text(25)],
  [/^7250$/, digits(8)],
  [/^7251$/, digits(12)],
  [/^8008$/, digits(12, 8)],
  [/^725[349]$/, text(40)],
  [/^(7256|8030|9[1-9])$/, text(90)],
  [/^(7257|8110|8112|8200)$/, text(70)],
  [/^7258$/, text(3, 3)],
  [/^8001$/, digits(14)],
  [/^8003$/, digitsThenText(14, 30)],
  [/^(8006|8026|801[78])$/, digits(18)],
  [/^8007$/, text(34)],
  [/^8009$/, text(50)],
  [/^8011$/, digits(12, 1)],
  [/^8019$/, digits(10, 1)],
  [/^804[01]$/, digits(15)],
  [/^8042$/, digits(32)],
  [/^8043$/, digits(20, 18)],
]

/** Lengths, identifier included, that end a value without a separator: by the first two digits (General Specifications, figure 7.8.4-2). */
const endsByItself: readonly (readonly [RegExp, number])[] = [
  [/^00/, 20],
  [/^0[123]/, 16],
  [/^1[1-9]/, 8],
  [/^20/, 4],
  [/^3[1-6]/, 10],
  [/^41/, 16],
]

const names: Readonly<Record<string, string>> = {
  '01': 'item number',
  '10': 'lot',
  '11': 'production date',
  '17': 'expiry date',
  '21': 'serial number',
}

// GS1 character set 82: what a text value may be made of. A space is not in it.
const OTHER_CHARACTER = /[^!"%&'()*+,\-./0-9:;<=>?A-Z_a-z]/
const DATES = /^1[1-35-7]$/
const WITH_CHECK_DIGIT = /^(0[0-3]|41[0-7])$/

/** The application identifier that stands at a place in a text, such as '01' or '3103'; null when GS1 knows none that begins so. */
export function identifierAt(from: string, at: number): string | null {
  const two = from.slice(at, at + 2)
  const length = /^(2[345]|4[012]|71)/.test(two) ? 3 : /^(3[1-69]|43|7[02]|8[0-2])/.test(two) ? 4 : 2
  const identifier = from.slice(at, at + length)
  return shapeOf(identifier) ? identifier : null
}

/** How many characters the value of an identifier takes without a separator after it; null when only a separator or the end ends it. */
export function ownLength(identifier: string): number | null {
  const whole = endsByItself.find(([first]) => first.test(identifier))?.[1]
  return whole === undefined ? null : whole - identifier.length
}

/** An identifier in words, such as 'lot (10)' or, when it is stepped over, 'part (240)'. */
export function nameOf(identifier: string): string {
  return `${names[identifier] ?? 'part'} (${identifier})`
}

/**
 * The first thing wrong with the value of an identifier; null when nothing is. Length and characters are held against every identifier,
 * check digits and dates against those that end by themselves: there a fault means that the code was misread.
 */
export function faultOf(identifier: string, value: string, today: LocalDay): Gs1Fault | null {
  const shape = shapeOf(identifier)
  if (!shape) return { offset: 0, says: 'is not known to GS1' }
  return lengthFault(value, shape) ?? characterFault(value, shape) ?? meaningFault(identifier, value, today)
}

function shapeOf(identifier: string): Shape | undefined {
  return shapes.find(([ai]) => ai.test(identifier))?.[1]
}

function lengthFault(value: string, { least, most }: Shape): Gs1Fault | null {
  if (value === '') return { offset: 0, says: 'is empty' }
  if (value.length < least) return { offset: value.length, says: `ends too early: ${least} characters belong to it` }
  if (value.length > most) return { offset: most, says: `is longer than ${most} characters` }
  return null
}

function characterFault(value: string, shape: Shape): Gs1Fault | null {
  const other = value.search(OTHER_CHARACTER)
  const notDigit = value.slice(0, shape.digits).search(/\D/)
  if (notDigit >= 0) return { offset: notDigit, says: 'has something other than digits where digits belong' }
  return other < 0 ? null : { offset: other, says: 'has a character that such codes do not use' }
}

function meaningFault(identifier: string, value: string, today: LocalDay): Gs1Fault | null {
  if (DATES.test(identifier) && !labelDate(value, today))
    return { offset: 0, says: `is no day of the calendar: ${value}` }
  if (WITH_CHECK_DIGIT.test(identifier) && !hasCheckDigit(value))
    return { offset: value.length - 1, says: 'has a check digit that does not fit' }
  return null
}
