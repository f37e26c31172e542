import { afterAll, beforeEach, expect, test, vi } from 'vitest'
import { closePasswords } from '#app/auth/password.server.ts'
import { demoAccounts, demoSeededAt, population } from '#database/demo.server.ts'
import { photographStore } from '#database/photograph-store.server.ts'
import { fileNames } from '#database/photographs.server.ts'
import { demoHospital } from '#database/seeders/hospital.ts'
import { loadDemo } from '#database/seeders/load.server.ts'
import { emptyDemo } from '#database/seeders/reset.server.ts'
import { select } from '#database/sequelize.server.ts'
import { verifyEntries } from '#database/verify-entries.server.ts'
import { cleared, owner } from '#test/database.ts'
import { aPerson } from '#test/people.ts'

const hospital = demoHospital(new Date('2026-12-01T14:06:00Z'), 'Europe/London')

// Each writes a hospital or two: seconds on a quiet machine.
vi.setConfig({ testTimeout: 120_000, hookTimeout: 60_000 })
beforeEach(cleared)
afterAll(closePasswords)

const hasFile = async (name: string) => (await photographStore.read(name)) !== undefined

test('an account that was disabled or given another password is not listed', async () => {
  await loadDemo(owner, hospital)
  await owner.query(`UPDATE users SET disabled_at = '2026-12-02 08:00:00' WHERE email = 'nurse.alder@example.org'`)
  await owner.query(`UPDATE users SET password_set_at = '2026-12-02 08:00:00' WHERE email = 'nurse2.alder@example.org'`)
  const emails = (await demoAccounts()).map(({ email }) => email)
  expect(emails).not.toContain('nurse.alder@example.org')
  expect(emails).not.toContain('nurse2.alder@example.org')
  expect(emails).toContain('nurse3.alder@example.org')
})

test('a demo hospital alone is emptied, and another one takes its place', async () => {
  await loadDemo(owner, hospital)
  const pictures = (await select<{ file: string }>('SELECT file FROM photographs')).map(
    ({ file }) => fileNames(file).small,
  )
  expect(await Promise.all(pictures.map(hasFile))).toEqual([true, true, true, true])
  await emptyDemo(owner)
  expect(await Promise.all(pictures.map(hasFile))).toEqual([false, false, false, false])
  expect(await population()).toEqual({ patients: 0, accounts: 0, otherPatients: 0, otherAccounts: 0 })
  const next = demoHospital(new Date('2026-12-03T09:30:00Z'), 'Europe/London')
  await loadDemo(owner, next)
  expect(await verifyEntries()).toMatchObject({ entries: next.entries.length, faults: [] })
})

test('nothing is emptied once there is a patient who was not invented', async () => {
  await loadDemo(owner, hospital)
  await owner.query(
    `INSERT INTO patients (id, record_number, family_name, given_name, born_on, sex, upper_airway, ventilated)
     VALUES ('019acb00-0000-7000-8000-000000000001', '100', 'Real', 'Person', '1960-01-01', 'female', 'open', FALSE)`,
  )
  await expect(emptyDemo(owner)).rejects.toThrow('the database also holds 1 patient not of the demo hospital')
  expect((await population()).patients).toBe(hospital.patients.length + 1)
})

test('nothing is emptied once there is an account that was not invented', async () => {
  await loadDemo(owner, hospital)
  await aPerson({ name: 'Ama Mensah' })
  await expect(emptyDemo(owner)).rejects.toThrow('the database also holds 1 account not of the demo hospital')
  expect(await demoAccounts()).not.toEqual([])
})

test('a second demo hospital is not laid over the first', async () => {
  await loadDemo(owner, hospital)
  const next = demoHospital(new Date('2026-12-03T09:30:00Z'), 'Europe/London')
  await expect(loadDemo(owner, next)).rejects.toThrow('Validation error')
  expect((await population()).patients).toBe(hospital.patients.length)
})

test('no account is listed and no time is told when no demo hospital is loaded', async () => {
  expect(await demoAccounts()).toEqual([])
  expect(await demoSeededAt()).toBeNull()
})

test('nothing is emptied when no demo hospital is loaded', async () => {
  await expect(emptyDemo(owner)).rejects.toThrow('No demo hospital is loaded')
})
