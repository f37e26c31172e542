import fc from 'fast-check'
import { v7 as uuidv7 } from 'uuid'
import { expect, test } from 'vitest'
import { addEntry, correctEntry, retractEntry } from '#database/entries.server.ts'
import { stayRecord } from '#database/records.server.ts'
import { recordStockAct } from '#database/stock-acts.server.ts'
import { cleared } from '#test/database.ts'
import { aStay, on } from '#test/stays.ts'
import { aSuction, keyOf, noSuction, stockWords, suctionWith } from '#test/stock.ts'

const items = { '12 Fr': { supply: 'catheter-12-fr' }, '14 Fr': { supply: 'catheter-14-fr' } } as const
const place = fc.constantFrom('store', '1', '2')
const item = fc.constantFrom('12 Fr', '14 Fr')
const what = fc.constantFrom('12 Fr', '14 Fr', 'none')
const few = fc.integer({ min: 1, max: 4 })
const pick = fc.nat({ max: 20 })

const step = fc.oneof(
  fc.record({ does: fc.constant('chart' as const), what }),
  fc.record({ does: fc.constant('correct' as const), pick, what }),
  fc.record({ does: fc.constant('retract' as const), pick }),
  fc.record({ does: fc.constant('receive' as const), place, item, few }),
  fc.record({ does: fc.constant('move' as const), place, to: place, item, few }),
  fc.record({ does: fc.constant('waste' as const), place, item, few }),
  fc.record({ does: fc.constant('count' as const), place, item, few }),
)
type Step = typeof step extends fc.Arbitrary<infer One> ? One : never
type Kind = '12 Fr' | '14 Fr' | 'none'

/** The same as a nurse would reckon it: piles that grow and shrink, and for each act where it took its catheter. */
class Piles {
  readonly piles = new Map<string, number>()
  readonly acts: { id: string; took: string | null; counts: boolean }[] = []

  put(pile: string, pieces: number) {
    this.piles.set(pile, (this.piles.get(pile) ?? 0) + pieces)
  }

  take(what: Kind): string | null {
    if (what === 'none') return null
    const atBed = pileOf('1', what)
    const pile = (this.piles.get(atBed) ?? 0) > 0 ? atBed : pileOf('store', what)
    this.put(pile, -1)
    return pile
  }

  giveBack(took: string | null) {
    if (took !== null) this.put(took, 1)
  }

  words(): readonly string[] {
    return [...this.piles].flatMap(([pile, pieces]) => (pieces === 0 ? [] : [`${pile} ${pieces}`])).toSorted()
  }
}

const pileOf = (where: string, of: '12 Fr' | '14 Fr') => `${where} ${keyOf(items[of])}`
const answersOf = (kind: Kind) => (kind === 'none' ? noSuction : suctionWith(kind))

async function done(one: Step, piles: Piles, { ward, nurse, stayId }: Awaited<ReturnType<typeof aStay>>) {
  const place = (label: string) => ({
    wardId: ward.id,
    bedId: label === 'store' ? null : (ward.bedIds[Number(label) - 1] ?? ''),
  })
  const standing = piles.acts.filter(({ counts }) => counts)
  const chosen = 'pick' in one ? standing[one.pick % Math.max(1, standing.length)] : undefined
  const id = uuidv7()
  const spine = { id, at: on('02', '10:00'), by: nurse.id, reason: 'Found so' }
  switch (one.does) {
    case 'chart':
      await addEntry({ ...aSuction(stayId, nurse, answersOf(one.what)), id })
      piles.acts.push({ id, took: piles.take(one.what), counts: true })
      return
    case 'correct': {
      if (!chosen) return
      const entry = { ...aSuction(stayId, nurse, answersOf(one.what)), id }
      await correctEntry({ ...entry, supersedes: chosen.id, reason: 'Misread' })
      chosen.counts = false
      piles.giveBack(chosen.took)
      piles.acts.push({ id, took: piles.take(one.what), counts: true })
      return
    }
    case 'retract': {
      const entry = chosen && (await stayRecord(stayId))?.entries.find(known => known.id === chosen.id)
      if (!chosen || !entry) return
      await retractEntry({ id, recordedBy: nurse, reason: 'Not done' }, entry)
      chosen.counts = false
      piles.giveBack(chosen.took)
      return
    }
    case 'receive':
      await recordStockAct({
        ...spine,
        act: 'received',
        item: items[one.item],
        to: place(one.place),
        quantity: one.few,
      })
      piles.put(pileOf(one.place, one.item), one.few)
      return
    case 'move': {
      const [from, to] = [place(one.place), place(one.to)]
      await recordStockAct({ ...spine, act: 'moved', item: items[one.item], from, to, quantity: one.few })
      piles.put(pileOf(one.place, one.item), -one.few)
      piles.put(pileOf(one.to, one.item), one.few)
      return
    }
    case 'waste':
      await recordStockAct({
        ...spine,
        act: 'wasted',
        item: items[one.item],
        from: place(one.place),
        quantity: one.few,
      })
      piles.put(pileOf(one.place, one.item), -one.few)
      return
    case 'count':
      await recordStockAct({ ...spine, act: 'counted', item: items[one.item], in: place(one.place), counted: one.few })
      piles.piles.set(pileOf(one.place, one.item), one.few)
  }
}

test('after any sequence of acts the stock is the sum of its moves, and what a nurse would reckon', async () => {
  await fc.assert(
    fc.asyncProperty(fc.array(step, { minLength: 1, maxLength: 25 }), async steps => {
      await cleared()
      const given = await aStay()
      const piles = new Piles()
      for (const one of steps) await done(one, piles, given)
      expect(await stockWords(given.ward.id)).toEqual(piles.words())
    }),
    { numRuns: 20 },
  )
}, 120_000)
