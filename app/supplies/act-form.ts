import { z } from 'zod'
import { text } from '../care/field.ts'
import { momentFields } from '../charting/chart-form.ts'

/** What can be done with the stock itself, by the last part of the address. */
export const stockActs = {
  receive: { title: 'Receive', button: 'Receive', from: null, to: 'Put into', quantity: 'Pieces received' },
  move: { title: 'Move', button: 'Move', from: 'Taken from', to: 'Put into', quantity: 'Pieces moved' },
  count: { title: 'Count', button: 'Keep count', from: 'Counted in', to: null, quantity: 'Pieces that lie there' },
  waste: { title: 'Waste', button: 'Chart waste', from: 'Taken from', to: null, quantity: 'Pieces thrown away' },
} as const

export type StockActName = keyof typeof stockActs

/** The act of an address; undefined for any other word. */
export function stockActOf(name: string): StockActName | undefined {
  return Object.hasOwn(stockActs, name) ? (name as StockActName) : undefined
}

const MOST_PIECES = 9999

const pieces = (label: string, least: number) =>
  z
    .number(`Enter the ${label.toLowerCase()} as a whole number`)
    .min(least, { error: least === 0 ? 'It cannot be less than none' : 'Enter at least 1', abort: true })
    .max(MOST_PIECES, { error: `Enter at most ${MOST_PIECES}`, abort: true })
    .int(`Enter the ${label.toLowerCase()} as a whole number`)

const place = z.string('Choose a place').max(64, 'Choose a place from the list')

/** The form of an act: which thing, how many, from where or to where, when, and why. */
export function stockActSchema(act: StockActName) {
  const { from, to, quantity } = stockActs[act]
  const reason = text({ label: 'Reason', maxLength: 500 })
  return z.object({
    ...momentFields,
    item: z.string('Choose an item').max(64, 'Choose an item from the list'),
    quantity: pieces(quantity, act === 'count' ? 0 : 1),
    from: from === null ? place.optional() : place,
    to: to === null ? place.optional() : place,
    reason: act === 'waste' ? reason : reason.optional(),
  })
}

export type StockActAnswers = z.output<ReturnType<typeof stockActSchema>>

/** The store of the ward as a form names it; any other place is a bed by its id, or another ward's store by `ward:` and its id. */
export const STORE = 'store'
export const OTHER_WARD = 'ward:'
