import { findKind } from '#app/care/kinds.ts'
import { effectiveEntries, patientRecord, readEntry, recordBefore } from '#app/care/record.ts'
import { type Identify, identifyIn, itemKey, type StockItem } from '#app/catalogue/identify.ts'
import { hoursBefore } from './bedside.ts'
import { demoCatalogue } from './catalogue.ts'
import { idAt, type Random, randomFrom } from './random.ts'
import type { DemoBed, DemoEntry, DemoHospital, DemoMove, DemoStockMove } from './rows.ts'

type Stocked = Omit<DemoHospital, 'stockMoves'>

/** For how many days before the seeding the demo hospital has kept its stock. */
const KEPT_DAYS = 15

/** The stock of the demo hospital: what its charting used, and what was received, laid at beds and counted before. */
export function demoStock(hospital: Stocked): readonly DemoStockMove[] {
  const { tubes, innerCannulas, fits } = demoCatalogue
  const itemOf = identifyIn({ tubes: tubes.filter(({ retiredAt }) => !retiredAt), cannulas: innerCannulas, fits })
  const used = hospital.stays.flatMap(({ id }) => usedIn(id, hospital, itemOf))
  return [...receivedFor(used, hospital), ...used]
}

function usedIn(stayId: string, hospital: Stocked, itemOf: Identify): readonly DemoStockMove[] {
  const stay = hospital.stays.find(({ id }) => id === stayId)
  const patient = hospital.patients.find(({ id }) => id === stay?.patientId)
  if (!stay || !patient) return []
  const entries = hospital.entries.filter(entry => entry.stayId === stayId)
  const record = patientRecord(entries, { admittedAt: stay.admittedAt, patient })
  const counting = new Set(effectiveEntries(entries).map(({ id }) => id))
  const since = hoursBefore(hospital.seededAt, KEPT_DAYS * 24 - 1)
  return entries
    .filter(({ id, performedAt }) => counting.has(id) && performedAt >= since)
    .flatMap(entry => {
      const kind = findKind(entry.kind)
      const [read] = kind ? readEntry(kind, entry) : []
      const uses = (read && kind?.uses?.(read.data, recordBefore(record, entry))) ?? []
      return uses.map(({ item, quantity }, part) => usageOf(entry, part, itemOf(item), -quantity, hospital.moves))
    })
}

function usageOf(
  entry: DemoEntry,
  part: number,
  item: StockItem,
  quantity: number,
  moves: readonly DemoMove[],
): DemoStockMove {
  const { id, stayId, performedAt, recordedAt, recordedById } = entry
  const place = moves.findLast(move => move.stayId === stayId && move.movedAt <= performedAt)
  const wardId = place?.wardId ?? moves.find(move => move.stayId === stayId)?.wardId ?? ''
  const whose = { entryId: id, stayId, movedAt: performedAt, recordedAt, recordedBy: recordedById }
  return { actId: id, part, act: 'used', wardId, bedId: null, item, quantity, counted: null, reason: null, ...whose }
}

/** Weeks in hand of each thing a ward uses, in turn: one is short, one was not received at all, the rest is there. */
const shares = [1.9, 2.6, 1.15, 3.1, 1.6, 2.2]

function receivedFor(used: readonly DemoStockMove[], hospital: Stocked): readonly DemoStockMove[] {
  const at = hoursBefore(hospital.seededAt, KEPT_DAYS * 24)
  return hospital.wards.flatMap(({ id: wardId, name }) => {
    const random = randomFrom(`stock of ${name} ${at.getTime()}`)
    const by = hospital.people.find(({ role, wardIds }) => role === 'charge nurse' && wardIds.includes(wardId))
    const gone = sums(used.filter(move => move.wardId === wardId))
    if (!by) return []
    const spine = { wardId, movedAt: at, recordedAt: at, recordedBy: by.id, entryId: null, stayId: null, counted: null }
    const boxes = gone.flatMap(({ item, pieces }, index) => {
      // What was not identified never came as such; the second kind of thing came too late, so that it stands below nothing.
      if ('supply' in item && item.supply.endsWith('not-identified')) return []
      const quantity =
        index === 1 ? Math.max(1, pieces - 3) : Math.ceil((pieces * (shares[index % shares.length] ?? 2)) / 10) * 10
      return [
        {
          ...spine,
          actId: idAt(at, random),
          part: 0,
          act: 'received',
          bedId: null,
          item,
          quantity,
          reason: 'Delivery',
        },
      ]
    })
    return [
      ...boxes,
      ...laidAtBeds(
        boxes,
        hospital.beds.filter(bed => bed.wardId === wardId),
        random,
      ),
    ]
  })
}

/** Some of what is made for a patient's tube lies at the beds: three pieces, one, or none. */
function laidAtBeds(
  boxes: readonly DemoStockMove[],
  beds: readonly DemoBed[],
  random: Random,
): readonly DemoStockMove[] {
  return boxes.slice(2, 5).flatMap((box, at) => {
    const bed = beds[at * 2]
    if (!bed) return []
    const quantity = Math.min(box.quantity, at === 0 ? 1 : 3)
    const moved = { ...box, actId: idAt(box.movedAt, random), act: 'moved', reason: null }
    return [
      { ...moved, part: 0, quantity: -quantity },
      { ...moved, part: 1, quantity, bedId: bed.id },
    ]
  })
}

function sums(moves: readonly DemoStockMove[]): readonly { readonly item: StockItem; readonly pieces: number }[] {
  const gone = new Map<string, { item: StockItem; pieces: number }>()
  for (const { item, quantity } of moves) {
    const known = gone.get(itemKey(item)) ?? { item, pieces: 0 }
    gone.set(itemKey(item), { item, pieces: known.pieces - quantity })
  }
  return [...gone.values()].toSorted((a, b) => (itemKey(a.item) < itemKey(b.item) ? -1 : 1))
}
