import { expect, test } from 'vitest'
import { faultOf, identifierAt, nameOf, ownLength } from './gs1-elements.ts'

test.each([
  ['0109521234543213', '01'],
  ['10ABC', '10'],
  ['235ABC', '235'],
  ['240REF', '240'],
  ['3103000123', '3103'],
  ['3920100', '3920'],
  ['4109501101020917', '410'],
  ['4307GB', '4307'],
  ['712ABC', '712'],
  ['719ABC', '719'],
  ['7003271231', '7003'],
  ['8006', '8006'],
  ['99X', '99'],
])('%s begins with identifier %s', (from, identifier) => {
  expect(identifierAt(from, 0)).toBe(identifier)
})

test.each(['', '0', '0A', '04', '05', '14', '18', '23', '239', '31', '310', '3106', '38', '5', '60', '89', '(0', '٠١'])(
  '"%s" begins with none',
  from => {
    expect(identifierAt(from, 0)).toBeNull()
  },
)

test('an identifier is found in the middle of a text', () => {
  expect(identifierAt('172712313103000123', 8)).toBe('3103')
  expect(identifierAt('17271231', 8)).toBeNull()
})

test.each([
  ['00', 18],
  ['01', 14],
  ['11', 6],
  ['17', 6],
  ['20', 2],
  ['3103', 6],
  ['410', 13],
  ['10', null],
  ['21', null],
  ['240', null],
  ['395', null],
  ['422', null],
  ['8006', null],
])('the value of %s ends by itself after %s characters', (identifier, length) => {
  expect(ownLength(identifier)).toBe(length)
})

test.each([
  ['01', '09521234543213'],
  ['10', 'A'],
  ['10', `!"%&'()*+,-./0123456`],
  ['10', '789:;<=>?ABCDEFGHIJK'],
  ['21', 'LMNOPQRSTUVWXYZ_abcd'],
  ['21', 'efghijklmnopqrstuvwx'],
  ['22', 'yz'],
  ['17', '271100'],
  ['30', '00000001'],
  ['242', '1'],
  ['253', '9521234567897'],
  ['423', '528056'],
])('(%s) may be %s', (identifier, value) => {
  expect(faultOf(identifier, value, '2026-12-01')).toBeNull()
})

test.each([
  ['01', '09521234543214', 13, 'has a check digit that does not fit'],
  ['01', '0952123454321', 13, 'ends too early: 14 characters belong to it'],
  ['01', '0952123454321X', 13, 'has something other than digits where digits belong'],
  ['02', '09521234543214', 13, 'has a check digit that does not fit'],
  ['10', '', 0, 'is empty'],
  ['10', '123456789012345678901', 20, 'is longer than 20 characters'],
  ['10', 'AB C', 2, 'has a character that such codes do not use'],
  ['10', 'AB~C', 2, 'has a character that such codes do not use'],
  ['10', 'ABÄ', 2, 'has a character that such codes do not use'],
  ['10', 'A\u001eB', 1, 'has a character that such codes do not use'],
  ['10', 'A\ud83d', 1, 'has a character that such codes do not use'],
  ['17', '271301', 0, 'is no day of the calendar: 271301'],
  ['15', '270230', 0, 'is no day of the calendar: 270230'],
  ['253', '952123456789X', 12, 'has something other than digits where digits belong'],
  ['718', '', 0, 'is empty'],
  ['05', '1', 0, 'is not known to GS1'],
])('(%s) may not be "%s"', (identifier, value, offset, says) => {
  expect(faultOf(identifier, value, '2026-12-01')).toEqual({ offset, says })
})

test('identifiers have the words of the ward, the others are parts', () => {
  expect(nameOf('17')).toBe('expiry date (17)')
  expect(nameOf('240')).toBe('part (240)')
})
