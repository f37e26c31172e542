import { afterAll, expect, test } from 'vitest'
import { closePasswords, isOutdated, oneTimePassword, passwordHash, passwordMatches } from './password.server.ts'

afterAll(closePasswords)

test('a password of a hundred characters counts to its last one', async () => {
  const password = 'Fern 🚲 gravel, lantern. '.repeat(6).slice(0, 99)
  const hash = await passwordHash(`${password}a`)
  expect(await passwordMatches(`${password}a`, hash)).toBe(true)
  expect(await passwordMatches(`${password}b`, hash)).toBe(false)
  expect(await passwordMatches(`${password}A`, hash)).toBe(false)
})

test('two ways of typing one character are one password', async () => {
  const hash = await passwordHash('caf\u00e9 gravel lantern')
  expect(await passwordMatches('cafe\u0301 gravel lantern', hash)).toBe(true)
})

test('the same password is stored differently each time, with the parameters beside it', async () => {
  const [one, two] = await Promise.all([passwordHash('fern gravel lantern'), passwordHash('fern gravel lantern')])
  expect(one).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$/)
  expect(one).not.toBe(two)
})

test('an account that is not there never matches', async () => {
  expect(await passwordMatches('fern gravel lantern', null)).toBe(false)
})

test('a hash made with weaker numbers is outdated', () => {
  expect(isOutdated('$argon2id$v=19$m=12288,t=3,p=1$c2FsdHNhbHQ$aGFzaA')).toBe(true)
  expect(isOutdated('$argon2id$v=19$m=19456,t=2,p=1$c2FsdHNhbHQ$aGFzaA')).toBe(false)
})

test('a stored hash that cannot be read is an error, not a wrong password', async () => {
  await expect(passwordMatches('fern gravel lantern', '$argon2id$broken')).rejects.toThrow(/could not read/)
})

// Eighty hashes take minutes on a busy machine.
test('past the queue a password is not looked at, and the caller can tell', { timeout: 120_000 }, async () => {
  const hash = await passwordHash('fern gravel lantern')
  const many = await Promise.allSettled(Array.from({ length: 80 }, () => passwordMatches('wrong kettle orbit', hash)))
  const refused = many.filter(one => one.status === 'rejected')
  expect(refused.length).toBeGreaterThan(0)
  for (const one of refused) expect(one.reason).toMatchObject({ name: 'PasswordsBusy' })
})

test('one-time passwords are four groups of four that are hard to misread', () => {
  expect(oneTimePassword()).toMatch(/^([A-HJ-NP-Z2-9]{4}-){3}[A-HJ-NP-Z2-9]{4}$/)
})
