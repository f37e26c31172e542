import { expect, test } from 'vitest'
import { passwordFault } from './password-rules.ts'

const owner = { name: 'Ngozi Adeyemi', email: 'n.adeyemi@ward.example', wardNames: ['Ward 7', 'Intensive care'] }

test.each([
  ['correct horse battery staple'],
  ['lamp orbit 9 thistle'],
  ['x7#Kq!v92LmZ'],
  ['password orbit thistle kettle'],
  ['😀 fern 🚲 gravel lantern'],
  [`${'kettle orbit fern '.repeat(5)}lantern77z`],
])('%s is accepted', password => {
  expect(passwordFault(password, owner)).toBeNull()
})

test.each([
  ['password1234'],
  ['Password-2026'],
  ['cannulary2026!'],
  ['Cannulary Cannulary 1'],
  ['Ward 7 2026 Ward 7'],
  ['ward7ward7ward7'],
  ['IntensiveCare2027'],
  ['NgoziAdeyemi1'],
  ['adeyemi-ngozi-99'],
  ['qwertyuiop123'],
  ['abcdefghijklm'],
  ['123456789012'],
  ['aaaaaaaaaaaaaa'],
  ['abababababab'],
  ['December2026!!'],
])('%s is refused as easy to guess', password => {
  expect(passwordFault(password, owner)).toMatch(/easy to guess/)
})

test('eleven characters are too few and twelve are enough', () => {
  expect(passwordFault('kettle fern', owner)).toMatch(/at least 12/)
  expect(passwordFault('kettle ferns', owner)).toBeNull()
})

test('a hundred and twenty-nine characters are too many', () => {
  const long = 'kettle orbit fern lantern gravel '.repeat(4).slice(0, 128)
  expect(passwordFault(long, owner)).toBeNull()
  expect(passwordFault(`${long}s`, owner)).toMatch(/at most 128/)
})

test('a character is counted once, however many bytes it takes', () => {
  expect(passwordFault('🚲🌿🪴🧭🪨🔔🕯️🪟🧵🪶', owner)).toMatch(/at least 12/)
})
