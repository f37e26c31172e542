import { expect, test } from 'vitest'
import { withAnswers, withoutAnswers, withUsual } from './form-address.ts'

test.each([
  ['/patients/1/chart/a', '/patients/1/chart/a'],
  ['/patients/1/chart/a?task=look&usual=1', '/patients/1/chart/a?task=look&usual=1'],
  ['/patients/1/chart/a?care.lot=7B&task=look&charted=2', '/patients/1/chart/a?task=look'],
  ['', ''],
])('%s is scanned for as %s', (address, kept) => {
  expect(withoutAnswers(address)).toBe(kept)
})

test('a scan leads back to the form with its answers beside what it was opened with', () => {
  const fill = { 'care.lot': ['7B/2'], 'care.expiresOn': [], 'care.scanned': ['barcode ]d201'] }
  expect(withAnswers('/patients/1/chart/a?task=look', fill)).toBe(
    '/patients/1/chart/a?task=look&care.lot=7B%2F2&care.expiresOn=&care.scanned=barcode+%5Dd201',
  )
})

test('the usual comes to what is in the address already', () => {
  expect(withUsual('?care.lot=7B&task=look')).toBe('?care.lot=7B&task=look&usual=1')
  expect(withUsual('')).toBe('?usual=1')
})
