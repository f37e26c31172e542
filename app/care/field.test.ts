import { expect, test } from 'vitest'
import { z } from 'zod'
import {
  arises,
  careFields,
  choice,
  choices,
  date,
  fieldsOf,
  isShown,
  nameOf,
  note,
  quantity,
  text,
  yesNo,
} from './field.ts'

const said = (schema: z.ZodType, value: unknown) => schema.safeParse(value).error?.issues.map(issue => issue.message)

const pressure = quantity({ label: 'Pressure found', unit: 'cmH2O', min: 0, max: 120, step: 0.1 })

test.each([0, 0.1, 0.3, 26, 29.9, 119.9, 120])('%s cmH2O can be charted in steps of 0.1 from 0 to 120', value => {
  expect(pressure.parse(value)).toBe(value)
})

test.each([
  [undefined, 'Enter the pressure found'],
  [-0.1, 'Pressure found must be from 0 to 120 cmH2O'],
  [120.1, 'Pressure found must be from 0 to 120 cmH2O'],
  ['26', 'Pressure found must be from 0 to 120 cmH2O'],
  [Number.NaN, 'Pressure found must be from 0 to 120 cmH2O'],
  [Number.POSITIVE_INFINITY, 'Pressure found must be from 0 to 120 cmH2O'],
  [26.05, 'Pressure found must be in steps of 0.1 cmH2O'],
])('%s as a pressure is answered with what to enter', (value, message) => {
  expect(said(pressure, value)).toContain(message)
})

test('a number without a step is a whole one', () => {
  expect(said(quantity({ label: 'Passes', unit: 'passes', min: 0, max: 9 }), 1.5)).toEqual([
    'Passes must be in steps of 1 passes',
  ])
})

test('the range of a number whose unit is another field is said without a unit', () => {
  expect(said(quantity({ label: 'Left at', unitField: 'unit', min: 0, max: 120 }), 121)).toEqual([
    'Left at must be from 0 to 120',
  ])
})

test('a choice is one of its options', () => {
  const leak = choice({ label: 'Leak heard', options: yesNo })
  expect(leak.parse('no')).toBe('no')
  expect(said(leak, 'perhaps')).toEqual(['Choose the leak heard'])
  expect(said(leak, undefined)).toEqual(['Choose the leak heard'])
})

const sites = choices({ label: 'Skin looked at', options: { left: 'Left', right: 'Right' } })

test.each([
  [undefined, 'Choose at least one for skin looked at'],
  [[], 'Choose at least one for skin looked at'],
  [['top'], 'Choose at least one for skin looked at'],
  [['left', 'left'], 'Choose each option once'],
])('%j as places looked at is sent back', (value, message) => {
  expect(said(sites, value)).toContain(message)
})

test('several options are kept in the order in which they were chosen', () => {
  expect(sites.parse(['right', 'left'])).toEqual(['right', 'left'])
})

test('a short line is trimmed', () => {
  expect(text({ label: 'Operator' }).parse('  A. Haddad ')).toBe('A. Haddad')
})

test.each([
  [undefined, 'Enter the operator'],
  ['   ', 'Enter the operator'],
  ['x'.repeat(121), 'Operator must be at most 120 characters'],
  ['A.\nHaddad', 'Operator has characters that cannot be stored'],
  ['A.\u0000Haddad', 'Operator has characters that cannot be stored'],
  ['A.\ud800Haddad', 'Operator has characters that cannot be stored'],
])('%j as a name is sent back', (value, message) => {
  expect(said(text({ label: 'Operator' }), value)).toContain(message)
})

test('a note may have several lines but no other control characters', () => {
  expect(note({ label: 'Note' }).parse('Wet.\r\nChanged.\tDry.')).toBe('Wet.\r\nChanged.\tDry.')
  expect(said(note({ label: 'Note' }), 'Wet\u0007')).toEqual(['Note has characters that cannot be stored'])
})

test('names and notes keep letters of every script and emoji whole', () => {
  expect(note({ label: 'Note' }).parse('Łucja Ñandú 李 👩‍⚕️')).toBe('Łucja Ñandú 李 👩‍⚕️')
})

test.each(['2026-02-30', '01-12-2026', '2026-12-1', '2026-12-01T10:00:00Z', ''])('%j is not a calendar date', value => {
  expect(said(date({ label: 'Review date' }), value)).toEqual(['Enter the review date as a date'])
})

test('the 29th of February is a date in leap years only', () => {
  expect(date({ label: 'Review date' }).safeParse('2028-02-29').success).toBe(true)
  expect(date({ label: 'Review date' }).safeParse('2026-02-29').success).toBe(false)
})

test.each(['', 'Cuff', '1st', 'a b', `a${'b'.repeat(64)}`, undefined])('%j is not the name of a task', value => {
  expect(said(nameOf('task', { label: 'Task' }), value)).toEqual(['Choose the task'])
})

const cuff = careFields({
  method: choice({ label: 'Method', options: { gauge: 'Gauge', none: 'Not measured' } }),
  found: quantity({
    label: 'Pressure found',
    unit: 'cmH2O',
    min: 0,
    max: 120,
    when: { field: 'method', is: ['gauge'] },
    neededThen: true,
  }).optional(),
  whyNot: text({ label: 'Why not', when: { field: 'method', is: ['none'] } }).optional(),
})

const issuesOf = (value: unknown) =>
  cuff.safeParse(value).error?.issues.map(({ path, message }) => `${path.join('.')}: ${message}`)

test('fields are listed in declared order with what a form needs', () => {
  expect(fieldsOf(cuff).map(({ name, required, meta }) => [name, required, meta.control])).toEqual([
    ['method', true, 'choice'],
    ['found', false, 'quantity'],
    ['whyNot', false, 'text'],
  ])
})

test('a field keeps its label when it is refined further', () => {
  const schema = careFields({ sites: sites.refine(chosen => chosen.length < 3) })
  expect(fieldsOf(schema)[0]?.meta.label).toBe('Skin looked at')
})

test('a field without a label cannot be declared', () => {
  const schema = z.object({ note: z.string() })
  expect(() => fieldsOf(schema)).toThrow('Field note has no label')
})

test('a question that arises and is needed then must be answered', () => {
  expect(issuesOf({ method: 'gauge' })).toEqual(['found: Enter the pressure found'])
})

test('a question that arises but is not needed may be left open', () => {
  expect(cuff.safeParse({ method: 'none' }).success).toBe(true)
})

test('an answer to a question that does not arise is sent back', () => {
  expect(issuesOf({ method: 'none', found: 26 })).toEqual(['found: Leave out the pressure found here'])
})

test('a field that the kind does not know is sent back, not dropped', () => {
  expect(cuff.safeParse({ method: 'gauge', found: 26, leftAt: 25 }).success).toBe(false)
})

test.each([
  ['sutures', 'loose', true],
  ['sutures', 'none', false],
  ['sutures', undefined, false],
  ['sites', ['left', 'loose'], true],
  ['sites', ['left'], false],
])('a question about loose %s arises with %j: %s', (field, value, expected) => {
  const meta = { control: 'text', label: 'Why', maxLength: 9, when: { field, is: ['loose'] } } as const
  expect(arises(meta, { [field]: value })).toBe(expected)
})

test('a question without a condition always arises', () => {
  expect(arises({ control: 'note', label: 'Note', maxLength: 9 }, {})).toBe(true)
})

test('the large number is shown until an answer speaks against it', () => {
  const when = { field: 'method', is: ['manometer'] }
  const large = { control: 'quantity', label: 'Found', min: 0, max: 9, step: 1, large: true, when } as const
  expect(isShown(large, {})).toBe(true)
  expect(isShown(large, { method: [''] })).toBe(true)
  expect(isShown(large, { method: ['not measured'] })).toBe(false)
  expect(isShown({ ...large, large: false }, {})).toBe(false)
})
