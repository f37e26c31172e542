import { describe, expect, test } from 'vitest'
import type { PatientFacts } from '#app/care/kind.ts'
import { aContext, anEntry, aTube, at } from '#app/care/make.ts'
import { tubeChanges } from '#app/care/tube-change/schema.ts'
import { printable } from '#app/print/fonts.server.ts'
import { signPdf } from '#app/print/sign-pdf.server.ts'
import { type BedHeadSign, bedHeadSign, type SignPerson } from '#app/rules/bed-head-sign.ts'
import { readPdf, withoutSpaces } from '#test/read-pdf.ts'

// The file is read with pdf.js, which knows nothing of the library that wrote it.

const somebody: SignPerson = {
  bed: 'A4',
  ward: 'Alder ward',
  familyName: 'Merrin',
  givenName: 'Tobias',
  bornOn: '1962-03-14',
  recordNumber: '3041 8877',
  allergies: 'Penicillin',
}

function signOf(person: Partial<SignPerson> = {}, patient: Partial<PatientFacts> = {}): BedHeadSign {
  const tube = aTube({ reason: 'first insertion', technique: 'percutaneous', longestUseDays: 29, sutures: 'in place' })
  const context = aContext([anEntry(tubeChanges, '2026-03-08 10:00', tube)], '14:06', { patient })
  const facts = { newStoma: true, isCuffed: true, isDual: true, hasConnectorOnInner: true }
  const numbers = [
    { who: 'Airway team', number: '2222' },
    { who: 'Intensive care', number: '4410' },
  ]
  return bedHeadSign(context, { ...somebody, ...person }, { numbers, facts, printedAt: at('14:06') })
}

/** Every text of a sign; numbers are on the drawing, and are read there. */
function textsOf(value: unknown): readonly string[] {
  if (typeof value === 'string') return [value]
  return value === null || typeof value !== 'object' ? [] : Object.values(value).flatMap(textsOf)
}

const address = 'https://care.example/patients/0193'
const read = async (sign: BedHeadSign) => readPdf(await signPdf(sign, address))

function lackingIn(words: string, sign: BedHeadSign): readonly string[] {
  const { plate, ...written } = sign
  const drawn = plate ? [`ID ${plate.idMm.toFixed(1)}`, `OD ${plate.odMm.toFixed(1)}`, plate.label] : []
  return [...textsOf(written), ...drawn].map(printable).filter(text => !words.includes(withoutSpaces(text)))
}

describe.each(['open', 'not open', 'not known'] as const)('the sign of an upper airway that is %s', upperAirway => {
  test('is one sheet of A4 on its long side, with every word of the page in it', async () => {
    const sign = signOf({}, { upperAirway })
    const { pages, title, isTagged } = await read(sign)
    expect(pages.map(({ width, height }) => [Math.round(width), Math.round(height)])).toEqual([[842, 595]])
    expect(lackingIn(pages[0]?.words ?? '', sign)).toEqual([])
    expect(title).toBe('Bed-head sign, bed A4')
    expect(isTagged).toBe(true)
  })
})

test.each([
  ['Demirağlı', 'Nurşen'],
  ['Szabó-Királyfi', 'Őzike'],
  ['Παπαδοπούλου', 'Ευφροσύνη'],
  ['Щербакова', 'Їванна'],
  ['Nguyễn', 'Thị Hồng Vân'],
  ['Łukasiewicz', 'Žofie'],
])('the name %s, %s is whole in the file', async (familyName, givenName) => {
  const sign = signOf({ familyName, givenName })
  const { pages } = await read(sign)
  expect(pages[0]?.words).toContain(withoutSpaces(`${familyName.toUpperCase()}, ${givenName}`))
})

test('a letter and its mark that came apart are put together', async () => {
  const { pages } = await read(signOf({ givenName: 'Jose\u0301' }))
  expect(pages[0]?.words).toContain('José')
})

test('a character that the typeface lacks is written as its number, not left out', async () => {
  const { pages } = await read(signOf({ familyName: '王', givenName: 'Mei' }))
  expect(pages[0]?.words).toContain('[U+738B],Mei')
})

test('the longest names, notes and allergies still leave one whole sheet', async () => {
  const long = (letters: string) => letters.repeat(500 / letters.length)
  const person = {
    bed: 'Bay 12 window 03',
    familyName: 'W'.repeat(80),
    givenName: 'Ålesund '.repeat(10).trim(),
    allergies: long('Latex and iodine; '.slice(0, 10)),
  }
  const sign = signOf(person, { laryngoscopy: '4', airwayNotes: long('Stiff neck') })
  const { pages } = await read(sign)
  expect(pages).toHaveLength(1)
  expect(lackingIn(pages[0]?.words ?? '', sign)).toEqual([])
})
