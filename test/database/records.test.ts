import fc from 'fast-check'
import { v7 as uuidv7 } from 'uuid'
import { beforeEach, expect, test, vi } from 'vitest'
import { addEntry, correctEntry } from '#database/entries.server.ts'
import { changePatient, patientSummary } from '#database/patients.server.ts'
import type * as recordsModule from '#database/records.server.ts'
import { select } from '#database/sequelize.server.ts'
import { discharge, move } from '#database/stay-changes.server.ts'
import { wardRev } from '#database/ward-revs.server.ts'
import { cleared, owner } from '#test/database.ts'
import { aCuffPressure, admitted, aWardOf, on } from '#test/stays.ts'

type Records = typeof recordsModule

let ward: Awaited<ReturnType<typeof aWardOf>>
let stayIds: string[]
let records: Records

/** The module anew, with nothing in memory, as in another process. */
async function anotherProcess(): Promise<Records> {
  vi.resetModules()
  return import('#database/records.server.ts')
}

beforeEach(async () => {
  await cleared()
  ward = await aWardOf(3)
  stayIds = []
  for (const bedId of ward.bedIds) stayIds.push((await admitted(ward.id, bedId, ward.nurse.id)).stayId)
  records = await anotherProcess()
})

const chart = (stayId: string, at = on('02', '10:00')) =>
  addEntry(aCuffPressure(stayId, ward.nurse, { performedAt: at }))

const first = () => stayIds[0] ?? ''

/** What is stored, by stay: ids in the order of their numbers, which must run from 1 without a gap. */
async function stored() {
  const rows = await select<{ stayId: string; id: string; number: number }>(
    'SELECT stay_id AS stayId, id, number FROM entries ORDER BY stay_id, number',
  )
  return new Map(
    stayIds.map(stayId => {
      const own = rows.filter(row => row.stayId === stayId)
      expect(own.map(({ number }) => number)).toEqual(own.map((_, index) => index + 1))
      return [stayId, own.map(({ id }) => id)]
    }),
  )
}

async function seenBy(process: Records) {
  const { stays } = await process.wardRecords(ward.id)
  return new Map(stays.map(({ stay, entries }) => [stay.id, entries.map(({ id }) => id)]))
}

test('a ward shows its patients by bed, with their facts and all that was charted', async () => {
  await chart(first())
  const { stays, rev } = await records.wardRecords(ward.id)
  expect(rev).toBe(await wardRev(ward.id))
  expect(stays.map(({ stay }) => stay.bedLabel)).toEqual(['1', '2', '3'])
  expect(stays[0]).toMatchObject({
    stay: { id: first(), wardName: 'Ward 7', admittedAt: on('01', '08:00'), dischargedAt: null, entryCount: 1 },
    patient: { familyName: 'Okafor', bornOn: '1961-03-14', ventilated: false, spo2Low: null },
    entries: [{ number: 1, kind: 'cuff-pressure', recordedByName: 'Nurse of Ward 7' }],
  })
})

test('a ward that nobody is in, or that is not there, is empty', async () => {
  const empty = await aWardOf(1, 'Ward 8')
  expect((await records.wardRecords(empty.id)).stays).toEqual([])
  expect(await records.wardRecords(uuidv7())).toEqual({ rev: 0, stays: [] })
})

test('the array of a stay stays the same until something is charted, and is never changed', async () => {
  await chart(first())
  const before = (await records.wardRecords(ward.id)).stays
  const again = (await records.wardRecords(ward.id)).stays
  expect(again[0]?.entries).toBe(before[0]?.entries)
  await chart(first())
  const after = (await records.wardRecords(ward.id)).stays
  expect(before[0]?.entries).toHaveLength(1)
  expect(after[0]?.entries).toHaveLength(2)
  expect(after[0]?.entries[0]).toBe(before[0]?.entries[0])
  expect(after[1]?.entries).toBe(before[1]?.entries)
})

test('what another process charted is seen at once', async () => {
  const other = await anotherProcess()
  await records.wardRecords(ward.id)
  await chart(first())
  expect((await other.wardRecords(ward.id)).stays[0]?.entries).toHaveLength(1)
  expect((await records.wardRecords(ward.id)).stays[0]?.entries).toHaveLength(1)
})

test('a late entry is in its place in the order of recording, whatever time it names', async () => {
  await chart(first(), on('03', '10:00'))
  await records.wardRecords(ward.id)
  await chart(first(), on('02', '10:00'))
  const { entries } = (await records.wardRecords(ward.id)).stays[0] ?? { entries: [] }
  expect(entries.map(({ performedAt }) => performedAt)).toEqual([on('03', '10:00'), on('02', '10:00')])
})

test.each<[string, () => Promise<unknown>, (seen: Awaited<ReturnType<Records['wardRecords']>>) => unknown, unknown]>([
  [
    'a discharge',
    () =>
      discharge(
        { stayId: first(), dischargedAt: on('03', '08:00'), reason: 'home', note: null, careAfter: false },
        ward.nurse.id,
      ),
    ({ stays }) => stays.length,
    2,
  ],
  [
    'an edit of a patient',
    async () => {
      const [row] = await select<{ id: string }>('SELECT patient_id AS id FROM stays WHERE id = :id', { id: first() })
      const patient = (await patientSummary(row?.id ?? ''))?.patient
      if (!patient) throw new Error('No patient')
      const { id, demo: _, version, ...details } = patient
      await changePatient(id, version, { ...details, ventilated: true }, ward.nurse.id)
    },
    ({ stays }) => stays[0]?.patient.ventilated,
    true,
  ],
])('%s shows in memory at once', async (_, write, seen, expected) => {
  await records.wardRecords(ward.id)
  await write()
  expect(seen(await records.wardRecords(ward.id))).toBe(expected)
})

test('a move to another ward shows on both', async () => {
  const other = await aWardOf(1, 'Ward 8')
  await chart(first())
  await Promise.all([records.wardRecords(ward.id), records.wardRecords(other.id)])
  const to = {
    id: uuidv7(),
    stayId: first(),
    wardId: other.id,
    bedId: other.bedIds[0] ?? '',
    movedAt: on('04', '08:00'),
  }
  expect(await move(to, ward.nurse.id)).toEqual({ outcome: 'moved' })
  expect((await records.wardRecords(ward.id)).stays).toHaveLength(2)
  expect((await records.wardRecords(other.id)).stays).toMatchObject([
    { stay: { id: first() }, entries: [{ number: 1 }] },
  ])
})

test('a discharged stay keeps its record', async () => {
  await chart(first())
  const end = { stayId: first(), dischargedAt: on('03', '08:00'), reason: 'home', note: null, careAfter: false }
  await discharge(end, ward.nurse.id)
  expect(await records.stayRecord(first())).toMatchObject({
    stay: { dischargedAt: on('03', '08:00'), dischargeReason: 'home' },
    entries: [{ number: 1 }],
  })
  expect(await records.stayRecord(uuidv7())).toBeUndefined()
})

test('a payload that no kind can read is handed on as it is', async () => {
  await owner.query(
    `INSERT INTO entries (id, stay_id, kind, version, performed_at, recorded_by, recorded_role, data)
     VALUES (UUID(), :stayId, 'cuff-pressure', 99, '2026-11-02 10:00:00', :by, 'nurse', '{"found":"much"}')`,
    { replacements: { stayId: first(), by: ward.nurse.id } },
  )
  await chart(first())
  const { entries } = (await records.stayRecord(first())) ?? { entries: [] }
  expect(entries).toMatchObject([{ version: 99, raw: { found: 'much' } }, { version: 1 }])
})

test('a hundred boards opened at once all see everything', async () => {
  for (let n = 0; n < 20; n += 1) await chart(stayIds[n % 3] ?? '')
  const fresh = await anotherProcess()
  const boards = await Promise.all(Array.from({ length: 100 }, () => seenBy(fresh)))
  const all = await stored()
  for (const board of boards) expect(board).toEqual(all)
})

type Step = { readonly does: 'chart' | 'correct' | 'read' | 'read elsewhere'; readonly stay: number }

const steps = fc.array(
  fc.record<Step>({
    does: fc.constantFrom('chart', 'chart', 'correct', 'read', 'read elsewhere'),
    stay: fc.nat({ max: 2 }),
  }),
  { minLength: 5, maxLength: 30 },
)

test('however charting and reading fall together, numbers have no gap and memory is what is stored', async () => {
  const elsewhere = await anotherProcess()
  const property = fc.asyncProperty(steps, async sequence => {
    const before = await stored()
    await Promise.all(
      sequence.map(async ({ does, stay }, at) => {
        const stayId = stayIds[stay] ?? ''
        const supersedes = before.get(stayId)?.[at]
        if (does === 'read') return seenBy(records)
        if (does === 'read elsewhere') return seenBy(elsewhere)
        if (does === 'chart' || supersedes === undefined) return chart(stayId)
        return correctEntry({ ...aCuffPressure(stayId, ward.nurse), supersedes, reason: 'Misread' })
      }),
    )
    const all = await stored()
    expect(await seenBy(records)).toEqual(all)
    expect(await seenBy(elsewhere)).toEqual(all)
  })
  await fc.assert(property, { numRuns: 15 })
}, 60_000)
