import { afterAll, beforeAll, expect, test } from 'vitest'
import { closePasswords, passwordMatches } from '#app/auth/password.server.ts'
import { passwordFault } from '#app/auth/password-rules.ts'
import { dueTasks } from '#app/rules/due-tasks.ts'
import { demoAccounts, demoPassphrase, demoSeededAt } from '#database/demo.server.ts'
import { policies } from '#database/policies.server.ts'
import { wardRecords } from '#database/records.server.ts'
import { demoHospital } from '#database/seeders/hospital.ts'
import { loadDemo } from '#database/seeders/load.server.ts'
import { credentialsOf } from '#database/users.server.ts'
import { verifyEntries } from '#database/verify-entries.server.ts'
import { cleared, owner } from '#test/database.ts'
import { contextOf, present } from '#test/demo-hospital.ts'

const hospital = demoHospital(new Date('2026-12-01T14:06:00Z'), 'Europe/London')

beforeAll(async () => {
  await cleared()
  await loadDemo(owner, hospital)
}, 120_000)

afterAll(closePasswords)

test('what is loaded is read back as it was made', async () => {
  for (const { id, name } of hospital.wards) {
    const { stays } = await wardRecords(id)
    const made = present(hospital, name).map(stay => hospital.entries.filter(({ stayId }) => stayId === stay.id))
    const plain = made.map(entries => entries.map(entry => ({ ...entry, witnessId: undefined })))
    expect(stays.map(({ entries }) => entries)).toEqual(plain)
    expect(stays.map(({ patient }) => patient.demo)).not.toContain(false)
  }
})

test('the chain of hashes holds over all entries, and each can be read', async () => {
  expect(await verifyEntries()).toMatchObject({ stays: 33, entries: hospital.entries.length, faults: [] })
})

test('the policies in force are those that were made', async () => {
  const stored = await policies()
  for (const { id, values, reviewedBy, reviewedOn, startsAt } of hospital.policies) {
    expect(stored).toContainEqual(expect.objectContaining({ id, values, reviewedBy, reviewedOn, startsAt }))
  }
})

test('the demo passphrase opens an account of each role, and would be accepted as a password', async () => {
  const account = await credentialsOf('nurse.alder@example.org')
  expect(await passwordMatches(demoPassphrase, account?.passwordHash ?? null)).toBe(true)
  for (const { name, email } of hospital.people) {
    const wardNames = hospital.wards.map(ward => ward.name)
    expect(passwordFault(demoPassphrase, { name, email, wardNames })).toBeNull()
  }
})

test('the accounts that the passphrase opens are listed with role and wards', async () => {
  const accounts = await demoAccounts()
  expect(accounts).toHaveLength(hospital.people.length)
  expect(accounts[0]).toEqual({
    name: 'Imani Brathwaite',
    email: 'nurse.alder@example.org',
    role: 'nurse',
    wardNames: ['Alder ward'],
  })
  expect(accounts.find(({ role }) => role === 'tracheostomy specialist')?.wardNames).toHaveLength(3)
})

test('the moment of seeding is told', async () => {
  expect(await demoSeededAt()).toEqual(new Date('2026-12-01T14:06:00Z'))
})

test('the board of a ward computes the same from stored rows', async () => {
  const [alder] = hospital.wards
  const { stays } = await wardRecords(alder?.id ?? '')
  const stored = { ...hospital, entries: stays.flatMap(({ entries }) => entries.map(e => ({ ...e, witnessId: null }))) }
  const tasks = (from: typeof hospital) =>
    present(hospital, 'Alder ward').map(stay =>
      dueTasks(contextOf(from, stay)).map(({ rule, status }) => [rule.name, status]),
    )
  expect(tasks(stored)).toEqual(tasks(hospital))
})
