import { QueryTypes } from 'sequelize'
import { v7 as uuidv7 } from 'uuid'
import { beforeEach, expect, test } from 'vitest'
import { addEntry } from '#database/entries.server.ts'
import { type Signature, signaturesOf, withSignatures } from '#database/entry-signatures.server.ts'
import { sequelize } from '#database/sequelize.server.ts'
import { verifySignatures } from '#database/verify-signatures.server.ts'
import { cleared, owner } from '#test/database.ts'
import { aPerson } from '#test/people.ts'
import { aCuffPressure, aStay } from '#test/stays.ts'

let bedside: Awaited<ReturnType<typeof aStay>>
let second: Awaited<ReturnType<typeof aPerson>>

beforeEach(async () => {
  await cleared()
  bedside = await aStay()
  second = await aPerson({ name: 'Kofi Lindstrand', wardIds: [bedside.ward.id] })
})

const bySecond = (): Signature => ({
  part: 'second person',
  userId: second.id,
  role: 'nurse',
  proof: 'password',
  competence: null,
})

async function signedEntry(signatures: readonly Signature[], witnessId: string | undefined = second.id) {
  const act = aCuffPressure(bedside.stayId, bedside.nurse, { id: uuidv7(), witnessId })
  await addEntry(act, withSignatures(act.id, signatures))
  return act.id
}

test('signatures are stored with their entry', async () => {
  const author: Signature = { ...bySecond(), part: 'author', userId: bedside.nurse.id, competence: 'out of date' }
  const id = await signedEntry([author, bySecond()])
  expect((await signaturesOf([id, uuidv7()])).get(id)).toEqual([author, bySecond()])
  expect(await verifySignatures()).toEqual({ signatures: 2, faults: [] })
})

test.each<[string, () => Signature, RegExp]>([
  [
    'in the place of the second person',
    () => ({ ...bySecond(), userId: bedside.ward.admin.id }),
    /author or the second/,
  ],
  ['as the author', () => ({ ...bySecond(), part: 'author' }), /author or the second/],
  ['as a second person without a password', () => ({ ...bySecond(), proof: 'session' }), /second_by_password/],
])('nobody signs %s, and the entry is not written either', async (_, signature, words) => {
  await expect(signedEntry([signature()])).rejects.toThrow(words)
  expect(await owner.query('SELECT id FROM entries', { type: QueryTypes.SELECT })).toEqual([])
})

test('nobody signs as the second person of an entry that names none', async () => {
  const act = aCuffPressure(bedside.stayId, bedside.nurse)
  await expect(addEntry(act, withSignatures(act.id, [bySecond()]))).rejects.toThrow(/author or the second/)
})

test.each([["UPDATE entry_signatures SET role = 'charge nurse'"], ['DELETE FROM entry_signatures']])(
  '%s is refused to everybody',
  async statement => {
    await signedEntry([bySecond()])
    await expect(owner.query(statement)).rejects.toThrow(/append-only/)
    await expect(sequelize.query(statement)).rejects.toThrow(/denied/)
  },
)

test('a signature that somebody with all rights changed is found', async () => {
  const id = await signedEntry([bySecond()])
  await owner.query('DROP TRIGGER entry_signatures_refuse_update')
  try {
    await owner.query("UPDATE entry_signatures SET role = 'charge nurse'")
    expect(await verifySignatures()).toEqual({ signatures: 1, faults: [{ entryId: id, part: 'second person' }] })
  } finally {
    await owner.query(`CREATE TRIGGER entry_signatures_refuse_update BEFORE UPDATE ON entry_signatures FOR EACH ROW
      SIGNAL SQLSTATE '45000' SET MESSAGE_TEXT = 'entry_signatures is append-only'`)
  }
})
