import fc from 'fast-check'
import { beforeEach, expect, test } from 'vitest'
import {
  catalogueInnerCannula,
  catalogueTube,
  innerCannulasFitting,
  tubesFitting,
  wholeCatalogue,
} from '#database/catalogue.server.ts'
import { catalogueChangesOf } from '#database/catalogue-changes.server.ts'
import { saveItems } from '#database/catalogue-writes.server.ts'
import { aCannulaToSave, aTubeToSave, someDualTube, someInnerCannula, someTube } from '#test/catalogue.ts'
import { cleared, owner } from '#test/database.ts'
import { aPerson } from '#test/people.ts'

let by: string

beforeEach(async () => {
  await cleared()
  by = (await aPerson({ name: 'Elsa Solberg', role: 'tracheostomy specialist' })).id
})

test('a tube is added with its line, changed, retired and put in use again, and all of it is kept', async () => {
  const tube = aTubeToSave()
  expect(await saveItems([tube], by)).toEqual({ outcome: 'saved' })
  await saveItems([{ ...tube, version: 1, item: 'tube', values: someTube({ od: 11.2 }) }], by)
  const changed = { ...tube, item: 'tube', values: someTube({ od: 11.2 }) } as const
  await saveItems([{ ...changed, version: 2, retired: true }], by)
  expect((await catalogueTube(tube.id))?.retiredAt).toBeInstanceOf(Date)
  await saveItems([{ ...changed, version: 3 }], by)
  expect(await catalogueTube(tube.id)).toMatchObject({ od: 11.2, retiredAt: null, version: 4, maker: 'Oskerry' })
  const history = await catalogueChangesOf(tube.id)
  expect(history.map(({ what, changedByName }) => [what, changedByName])).toEqual([
    ['tube put in use again', 'Elsa Solberg'],
    ['tube retired', 'Elsa Solberg'],
    ['tube changed', 'Elsa Solberg'],
    ['tube added', 'Elsa Solberg'],
  ])
  expect(history[2]).toMatchObject({ oldValues: { od: '11' }, newValues: { od: '11.2' } })
})

test('what was looked at before somebody else changed it is not written over', async () => {
  const tube = aTubeToSave()
  await saveItems([tube], by)
  await saveItems([{ ...tube, version: 1, retired: true }], by)
  expect(await saveItems([{ ...tube, version: 1 }], by)).toEqual({ outcome: 'changed meanwhile' })
})

test('no two items share a GTIN or all that describes them, and nothing of such a batch is kept', async () => {
  await saveItems([aTubeToSave(someTube({ gtin: '09521234543213' })), aCannulaToSave()], by)
  const other = aTubeToSave(someTube({ size: '9.0' }))
  expect(await saveItems([other, aCannulaToSave(someInnerCannula({ size: '9', gtin: '9521234543213' }))], by)).toEqual({
    outcome: 'gtin taken',
  })
  expect(await saveItems([other, aTubeToSave()], by)).toEqual({ outcome: 'described already' })
  expect(await catalogueTube(other.id)).toBeUndefined()
})

test('a line has one maker, and an item stays in its line', async () => {
  const tube = aTubeToSave()
  await saveItems([tube], by)
  const elsewhere = someTube({ maker: 'Vastenhaug', size: '9.0' })
  expect(await saveItems([aTubeToSave(elsewhere)], by)).toEqual({ outcome: 'other maker' })
  const moved = { ...tube, version: 1, item: 'tube', values: someTube({ line: 'Other' }) } as const
  expect(await saveItems([moved], by)).toEqual({ outcome: 'other line' })
})

test('two items may exchange their GTINs', async () => {
  const [one, other] = ['09521234543213', '09521100000017']
  const a = aTubeToSave(someTube({ gtin: one }))
  const b = aTubeToSave(someTube({ size: '9.0', gtin: other }))
  await saveItems([a, b], by)
  const swapped = [
    { ...a, version: 1, item: 'tube', values: someTube({ gtin: other }) } as const,
    { ...b, version: 1, item: 'tube', values: someTube({ size: '9.0', gtin: one }) } as const,
  ]
  expect(await saveItems(swapped, by)).toEqual({ outcome: 'saved' })
  expect((await catalogueTube(a.id))?.gtin).toBe(other)
})

test('an inner cannula fits a tube exactly when the tube fits it, after any sequence of saves', async () => {
  const cannulas = ['7.0', '8.0', '9.0'].map(size => aCannulaToSave(someInnerCannula({ size })))
  const tubes = ['7.0', '8.0', '9.0'].map(size => aTubeToSave(someDualTube({ size })))
  await saveItems([...cannulas, ...tubes], by)
  const step = fc.record({ tube: fc.nat(2), fits: fc.subarray(cannulas.map(({ id }) => id)) })
  await fc.assert(
    fc.asyncProperty(fc.array(step, { minLength: 1, maxLength: 4 }), async steps => {
      for (const { tube, fits } of steps) {
        const item = tubes[tube]
        if (item) await saveItems([{ ...item, fitIds: fits }], by)
      }
      const pairs = new Set((await wholeCatalogue()).fits.map(fit => `${fit.tubeId} ${fit.innerCannulaId}`))
      for (const tube of tubes) {
        const fitting = (await innerCannulasFitting(tube.id)).map(({ id }) => id)
        for (const cannula of cannulas) {
          const isFitting = (await tubesFitting(cannula.id)).some(({ id }) => id === tube.id)
          expect([fitting.includes(cannula.id), isFitting]).toEqual(
            Array(2).fill(pairs.has(`${tube.id} ${cannula.id}`)),
          )
        }
      }
    }),
    { numRuns: 10 },
  )
}, 60_000)

test('the history refuses to be changed', async () => {
  await saveItems([aCannulaToSave()], by)
  await expect(owner.query('UPDATE catalogue_changes SET what = 1')).rejects.toThrow('append-only')
  await expect(owner.query('DELETE FROM catalogue_changes')).rejects.toThrow('append-only')
})

test('an item that is not there is undefined', async () => {
  expect(await catalogueInnerCannula('019acb00-0000-7000-8000-000000000001')).toBeUndefined()
})
