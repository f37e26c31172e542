import { expect, test } from 'vitest'
import { returnPath, signInPath } from './return-to.ts'

test.each([
  ['/patients/1?span=24', '/patients/1?span=24'],
  ['/patients/1#top', '/patients/1'],
  ['/', '/'],
  ['/a/../b', '/b'],
])('%s is kept', (wanted, path) => {
  expect(returnPath(wanted)).toBe(path)
})

test.each([
  ['https://elsewhere.example/'],
  ['//elsewhere.example/'],
  ['/\\elsewhere.example/'],
  ['\\\\elsewhere.example'],
  ['/\t/elsewhere.example'],
  ['/\n//elsewhere.example'],
  ['/.//elsewhere.example'],
  ['/a/..//elsewhere.example'],
  ['javascript:alert(1)'],
  ['patients/1'],
  [''],
  [undefined],
  [null],
])('%j leads nowhere but home', wanted => {
  expect(returnPath(wanted)).toBe('/')
})

test('the way back is carried in the address of the sign-in page', () => {
  expect(signInPath('/patients/1?span=24')).toBe('/sign-in?returnTo=%2Fpatients%2F1%3Fspan%3D24')
  expect(signInPath('/')).toBe('/sign-in')
})
