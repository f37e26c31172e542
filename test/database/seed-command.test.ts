import { afterAll, beforeEach, expect, test, vi } from 'vitest'
import { closePasswords } from '#app/auth/password.server.ts'
import { demoSeededAt, population } from '#database/demo.server.ts'
import { type Seeding, seed } from '#database/seeders/seed.server.ts'
import { cleared, owner } from '#test/database.ts'
import { aPerson } from '#test/people.ts'

const seeded = (how: Seeding, now: string) => seed(owner, how, new Date(now), 'Europe/London')

// Each writes a hospital or two: seconds on a quiet machine.
vi.setConfig({ testTimeout: 120_000, hookTimeout: 60_000 })
beforeEach(cleared)
afterAll(closePasswords)

test('an empty database gets a demo hospital, and a line says what is in it', async () => {
  expect(await seeded('if empty', '2026-12-01T14:06:00Z')).toMatch(
    /^Demo hospital as of 01-Dec-2026 14:06: 3 wards, 33 patients, 28 accounts, \d+ entries, in [\d.]+ s\.$/,
  )
})

test('a demo hospital is not made twice, tells its age after a day, and is replaced when that is asked for', async () => {
  await seeded('only', '2026-12-01T14:06:00Z')
  const loaded = 'The demo hospital was made on 01-Dec-2026 14:06.'
  expect(await seeded('if empty', '2026-12-02T14:06:00Z')).toBe(loaded)
  expect(await seeded('if empty', '2026-12-02T15:10:00Z')).toBe(
    `${loaded} It is 1 d 1 h old, so all its care is late. Make a fresh one: npm run seed -- --reset`,
  )
  await expect(seeded('only', '2026-12-01T15:10:00Z')).rejects.toThrow(
    `Nothing was changed. ${loaded} To replace it: npm run seed -- --reset`,
  )
  await seeded('reset', '2026-12-02T15:10:00Z')
  expect(await demoSeededAt()).toEqual(new Date('2026-12-02T15:10:00Z'))
})

test('a database in use is left as it is', async () => {
  await aPerson({ name: 'Ama Mensah' })
  const inUse = 'The database is in use, so no demo hospital is added.'
  expect(await seeded('if empty', '2026-12-01T14:06:00Z')).toBe(inUse)
  await expect(seeded('only', '2026-12-01T14:06:00Z')).rejects.toThrow(inUse)
  await expect(seeded('reset', '2026-12-01T14:06:00Z')).rejects.toThrow('No demo hospital is loaded')
  expect((await population()).accounts).toBe(1)
})
