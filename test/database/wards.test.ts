import { v7 as uuidv7 } from 'uuid'
import { beforeEach, expect, test } from 'vitest'
import { addBed, bedsOf, changeBed } from '#database/beds.server.ts'
import { changesOf } from '#database/record-changes.server.ts'
import { wardRev } from '#database/ward-revs.server.ts'
import { addWard, allWards, changeWard, wardById } from '#database/wards.server.ts'
import { cleared } from '#test/database.ts'
import { admitted, aWardOf } from '#test/stays.ts'

let ward: Awaited<ReturnType<typeof aWardOf>>

beforeEach(async () => {
  await cleared()
  ward = await aWardOf(2)
})

const another = (name: string) => ({
  id: uuidv7(),
  name,
  shiftTimes: ['08:00', '20:00'],
  pressureUnit: 'mmHg' as const,
})

async function bed(label: string) {
  const found = (await bedsOf(ward.id)).find(one => one.label === label)
  if (!found) throw new Error(`No bed ${label}`)
  const { occupied: _, ...rest } = found
  return rest
}

test('a ward is added once, under a name that no other has', async () => {
  const eight = another('Ward 8')
  expect(await addWard(eight, ward.admin.id)).toEqual({ outcome: 'saved' })
  expect(await addWard(eight, ward.admin.id)).toEqual({ outcome: 'saved' })
  expect(await addWard(another('ward 8'), ward.admin.id)).toEqual({ outcome: 'name taken' })
  expect(await wardById(eight.id)).toEqual({ ...eight, emergencyNumbers: [], retired: false })
  expect((await allWards()).map(({ name, beds }) => [name, beds])).toEqual([
    ['Ward 7', 2],
    ['Ward 8', 0],
  ])
})

test('a ward with patients stays in use; a change is noted with the old and the new', async () => {
  const seven = await wardById(ward.id)
  if (!seven) throw new Error('No ward')
  const rev = await wardRev(ward.id)
  await admitted(ward.id, ward.bedIds[0] ?? '', ward.nurse.id)
  expect(await changeWard({ ...seven, retired: true }, ward.admin.id)).toEqual({ outcome: 'has patients' })
  expect(await changeWard({ ...seven, pressureUnit: 'kPa' }, ward.admin.id)).toEqual({ outcome: 'saved' })
  expect(await wardRev(ward.id)).toBe(rev + 2)
  expect(await changesOf([ward.id])).toMatchObject([
    { what: 'ward changed', oldValues: { pressureUnit: 'cmH2O' }, newValues: { pressureUnit: 'kPa' } },
    { what: 'ward added' },
  ])
  expect(await changeWard({ ...another('Ward 9'), retired: false }, ward.admin.id)).toEqual({ outcome: 'not there' })
})

test('beds are added behind the others, each label once', async () => {
  const three = { id: uuidv7(), wardId: ward.id, label: '3' }
  expect(await addBed(three, ward.admin.id)).toEqual({ outcome: 'saved' })
  expect(await addBed(three, ward.admin.id)).toEqual({ outcome: 'saved' })
  expect(await addBed({ ...three, id: uuidv7() }, ward.admin.id)).toEqual({ outcome: 'label taken' })
  expect((await bedsOf(ward.id)).map(({ label, position }) => [label, position])).toEqual([
    ['1', 1],
    ['2', 2],
    ['3', 3],
  ])
})

test('a bed that somebody lies in stays in use, and one of another ward is not found', async () => {
  await admitted(ward.id, ward.bedIds[0] ?? '', ward.nurse.id)
  expect(await changeBed({ ...(await bed('1')), retired: true }, ward.admin.id)).toEqual({ outcome: 'occupied' })
  expect(await changeBed({ ...(await bed('2')), retired: true }, ward.admin.id)).toEqual({ outcome: 'saved' })
  expect(await changeBed({ ...(await bed('1')), label: '2' }, ward.admin.id)).toEqual({ outcome: 'label taken' })
  const other = await aWardOf(1, 'Ward 8')
  expect(await changeBed({ ...(await bed('1')), wardId: other.id }, ward.admin.id)).toEqual({ outcome: 'not there' })
})
