import { validate as isUuid } from 'uuid'
import type { CurrentUser } from '#app/auth/permissions.ts'
import { supplyItems } from '#app/care/supply.ts'
import { readForm } from '#app/sent-form.server.ts'
import { type FormOutcome, momentOf, refusedAt, refusedForm, type Sent } from '#app/stays/moment.server.ts'
import { OTHER_WARD, STORE, type StockActAnswers, type StockActName, stockActSchema } from '#app/supplies/act-form.ts'
import { days, earlier } from '#app/time/duration.ts'
import { bedsOf } from '#database/beds.server.ts'
import { searchInnerCannulas, searchTubes } from '#database/catalogue-search.server.ts'
import { stockOfWard } from '#database/stock.server.ts'
import { type Place, recordStockAct, type StockAct, type StockActed } from '#database/stock-acts.server.ts'
import { cannulaWords, itemOfKey, type StockItem, tubeWords, wordsOfItems } from '#database/stock-items.server.ts'
import { allWards } from '#database/wards.server.ts'

export const STOCK_DAYS_BACK = 30
const MOST_FOUND = 50

/** What a form about the stock of a ward chooses from. `find`: words to look for in the catalogue; `item`: one that is named already. */
export async function stockChoices(wardId: string, { find, item }: { readonly find: string; readonly item: string }) {
  const search = { words: find, page: 1, pageSize: MOST_FOUND }
  const [stock, beds, wards, tubes, cannulas] = await Promise.all([
    stockOfWard(wardId),
    bedsOf(wardId),
    allWards(),
    find === '' ? { tubes: [] } : searchTubes(search),
    find === '' ? { innerCannulas: [] } : searchInnerCannulas(search),
  ])
  const kept = await wordsOfItems([...new Set([...stock.map(one => one.item), ...(item === '' ? [] : [item])])])
  const items = new Map<string, string>([
    ...cannulas.innerCannulas.map(one => [one.id, cannulaWords(one)] as const),
    ...tubes.tubes.map(one => [one.id, tubeWords(one)] as const),
    ...[...kept].map(([item, { words }]) => [item, words] as const),
    ...Object.entries(supplyItems),
  ])
  return {
    found: find === '' ? null : tubes.tubes.length + cannulas.innerCannulas.length,
    items: Object.fromEntries([...items].toSorted(([, a], [, b]) => a.localeCompare(b, 'en'))),
    places: Object.fromEntries([
      [STORE, 'Store of the ward'] as const,
      ...beds.filter(({ retired }) => !retired).map(({ id, label }) => [id, `Bed ${label}`] as const),
    ]),
    otherWards: Object.fromEntries(
      wards
        .filter(({ id, retired }) => id !== wardId && !retired)
        .map(({ id, name }) => [`${OTHER_WARD}${id}`, `Store of ${name}`] as const),
    ),
  }
}

type Asked = { readonly user: CurrentUser; readonly wardId: string; readonly now: Date }

/** Does what a form says with the stock of a ward, or answers with the form and what is wrong with it. */
export async function stockActedBy(sent: FormData, act: StockActName, asked: Asked): Promise<FormOutcome> {
  const submission = readForm(sent, stockActSchema(act))
  if (submission.status !== 'success') return { status: 400, reply: submission.reply() }
  const { value } = submission
  const { user, wardId, now } = asked
  const moment = momentOf(value, { user, now, beganAt: new Date(0) }, submission)
  if (!('at' in moment)) return moment
  if (moment.at < earlier(now, days(STOCK_DAYS_BACK))) {
    const field = value.when === 'other' ? 'day' : 'when'
    return refusedAt(field, `Enter a day within the last ${STOCK_DAYS_BACK}`, submission)
  }
  const item = await itemOfKey(value.item)
  if (!item) return refusedAt('item', 'Choose an item from the list', submission)
  const done = await stockActOf(act, { value, item, wardId, at: moment.at, by: user.id })
  if ('field' in done) return refusedAt(done.field, done.says, submission)
  return afterAct(await recordStockAct(done), wardId, submission)
}

interface Read {
  readonly value: StockActAnswers
  readonly item: StockItem
  readonly wardId: string
  readonly at: Date
  readonly by: string
}

type Wrong = { readonly field: string; readonly says: string }

async function stockActOf(act: StockActName, { value, item, wardId, at, by }: Read): Promise<StockAct | Wrong> {
  const places = await stockPlaces(wardId)
  const spine = { id: value.id, item, at, by, reason: value.reason ?? null }
  const from = value.from === undefined ? undefined : places.get(value.from)
  const to = value.to === undefined ? undefined : places.get(value.to)
  const unknown = (field: string): Wrong => ({ field, says: 'Choose a place from the list' })
  const { quantity } = value
  if (act === 'receive') return to?.wardId === wardId ? { ...spine, act: 'received', to, quantity } : unknown('to')
  if (from?.wardId !== wardId) return unknown('from')
  if (act === 'count') return { ...spine, act: 'counted', in: from, counted: quantity }
  if (act === 'waste') return { ...spine, act: 'wasted', from, quantity }
  if (!to) return unknown('to')
  if (value.from === value.to) return { field: 'to', says: 'Choose another place than the one it was taken from' }
  return { ...spine, act: 'moved', from, to, quantity }
}

/** The places that a form may name: the store and the beds of the ward, and the stores of others. */
async function stockPlaces(wardId: string): Promise<ReadonlyMap<string, Place>> {
  const [beds, wards] = await Promise.all([bedsOf(wardId), allWards()])
  return new Map<string, Place>([
    [STORE, { wardId, bedId: null }],
    ...beds.map(({ id }) => [id, { wardId, bedId: id }] as const),
    ...wards
      .filter(({ id, retired }) => id !== wardId && !retired)
      .map(({ id }) => [`${OTHER_WARD}${id}`, { wardId: id, bedId: null }] as const),
  ])
}

function afterAct({ outcome }: StockActed, wardId: string, submission: Sent): FormOutcome {
  switch (outcome) {
    case 'recorded':
    case 'already recorded':
      return { to: `/wards/${wardId}/supplies` }
    case 'no such place':
      return refusedForm(409, 'This bed is not on the ward any more. Open the form again.', submission)
    case 'other body under this id':
      return refusedForm(422, 'This form was used before, with other answers. Open it again.', submission)
  }
}

/** An item that an address names; empty for anything else, so that nothing is chosen. */
export function itemIn(url: URL): string {
  const item = url.searchParams.get('item') ?? ''
  return isUuid(item) || Object.hasOwn(supplyItems, item) ? item : ''
}

/** A place of the ward that an address names; empty for anything else. */
export function placeIn(
  url: URL,
  name: 'from' | 'to',
  { places }: Pick<Awaited<ReturnType<typeof stockChoices>>, 'places'>,
): string {
  const place = url.searchParams.get(name) ?? ''
  return Object.hasOwn(places, place) ? place : ''
}
