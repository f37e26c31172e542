import { env } from '#app/env.server.ts'
import { showDateTime } from '#app/time/display.ts'
import { type MoveRow, moveCursorText, readMoveCursor, stockHistory } from '#database/stock-history.server.ts'
import { type ItemWords, wordsOfItems } from '#database/stock-items.server.ts'
import { itemIn } from './stock-act.server.ts'

const PAGE_SIZE = 50

/** A page of a ward's moves as words; `older` leads to the next one. `of`: the one item that the address asks for. */
export async function stockMoves(wardId: string, url: URL) {
  const asked = itemIn(url)
  const item = asked === '' ? undefined : asked
  const before = readMoveCursor(url.searchParams.get('before'))
  const { moves, next } = await stockHistory(wardId, { limit: PAGE_SIZE, before, item })
  const words = await wordsOfItems([...new Set([...moves.map(move => move.item), ...(item ? [item] : [])])])
  const older = new URLSearchParams({ ...(item ? { item } : {}), ...(next ? { before: moveCursorText(next) } : {}) })
  return {
    of: item === undefined ? null : (words.get(item)?.words ?? null),
    moves: moves.map(move => moveWords(move, words)),
    older: next ? `?${older}` : null,
  }
}

const acts: Readonly<Record<string, string>> = {
  received: 'Received',
  moved: 'Moved',
  used: 'Used',
  'given back': 'Given back',
  counted: 'Counted',
  wasted: 'Wasted',
}

function moveWords(move: MoveRow, words: ReadonlyMap<string, ItemWords>) {
  const { act, counted, quantity, entryId } = move
  const signed = quantity > 0 ? `+${quantity}` : String(quantity)
  return {
    key: `${move.actId} ${move.part}`,
    done: showDateTime(move.movedAt, env.hospitalTimeZone),
    what: acts[act] ?? act,
    href: entryId === null ? null : `/entries/${entryId}`,
    item: words.get(move.item)?.words ?? 'An item that is not in the catalogue any more',
    pieces: counted === null ? signed : `${signed}, ${counted} there`,
    place: placeWords(move),
    by: move.recordedByName,
    reason: move.reason ?? '',
  }
}

function placeWords({ act, bedLabel, otherBed, otherWard, quantity }: MoveRow): string {
  const here = bedLabel === null ? 'Store' : `Bed ${bedLabel}`
  if (act !== 'moved') return here
  const store = otherWard === null ? 'store' : `store of ${otherWard}`
  const there = otherBed === null ? store : `bed ${otherBed}`
  return quantity < 0 ? `${here}, to ${there}` : `${here}, from ${there}`
}
