import { select } from './sequelize.server.ts'

/** One move as the history of a ward shows it. `entryId`: of a use or a give-back, the entry it belongs to. */
export type MoveRow = {
  readonly actId: string
  readonly part: number
  readonly act: string
  readonly item: string
  readonly bedLabel: string | null
  readonly quantity: number
  readonly counted: number | null
  readonly entryId: string | null
  readonly movedAt: Date
  readonly recordedAt: Date
  readonly recordedByName: string
  readonly reason: string | null
  /** Where it came from or went to, when that is another place. */
  readonly otherWard: string | null
  readonly otherBed: string | null
}

/** Where a page of the history ended: the next one holds what was recorded before. */
export type MoveCursor = Pick<MoveRow, 'recordedAt' | 'actId' | 'part'>

/** A page of a ward's moves, latest recorded first, and where the next page starts: null at the end. */
export async function stockHistory(
  wardId: string,
  options: { readonly limit: number; readonly before?: MoveCursor | undefined; readonly item?: string | undefined },
): Promise<{ readonly moves: readonly MoveRow[]; readonly next: MoveCursor | null }> {
  const { limit, before, item } = options
  const rows = await select<MoveRow>(
    `SELECT m.act_id AS actId, m.part, m.act, m.item, b.label AS bedLabel, m.quantity, m.counted, m.entry_id AS entryId,
       m.moved_at AS movedAt, m.recorded_at AS recordedAt, u.name AS recordedByName, m.reason,
       IF(o.ward_id = m.ward_id, NULL, ow.name) AS otherWard, ob.label AS otherBed
     FROM stock_moves m LEFT JOIN beds b ON b.id = m.bed_id LEFT JOIN users u ON u.id = m.recorded_by
       LEFT JOIN stock_moves o ON m.act = 'moved' AND o.act_id = m.act_id AND o.part <> m.part
       LEFT JOIN wards ow ON ow.id = o.ward_id LEFT JOIN beds ob ON ob.id = o.bed_id
     WHERE m.ward_id = :wardId ${item === undefined ? '' : 'AND m.item = :item'}
       ${before ? 'AND (m.recorded_at, m.act_id, m.part) < (:recordedAt, :actId, :part) AND m.recorded_at <= :recordedAt' : ''}
     ORDER BY m.recorded_at DESC, m.act_id DESC, m.part DESC LIMIT :limit`,
    {
      wardId,
      item: item ?? null,
      limit: limit + 1,
      recordedAt: before?.recordedAt ?? null,
      actId: before?.actId ?? null,
      part: before?.part ?? null,
    },
  )
  const moves = rows.slice(0, limit)
  const last = rows.length > limit ? moves.at(-1) : undefined
  return { moves, next: last ? { recordedAt: last.recordedAt, actId: last.actId, part: last.part } : null }
}

/** A cursor as a word in an address. */
export function moveCursorText({ recordedAt, actId, part }: MoveCursor): string {
  return `${recordedAt.toISOString()}_${actId}_${part}`
}

/** The cursor of an address; undefined when it is none. */
export function readMoveCursor(text: string | null): MoveCursor | undefined {
  const [, at = '', actId = '', part = ''] =
    /^(\d{4}-\d\d-\d\dT\d\d:\d\d:\d\d\.\d{3}Z)_([0-9a-f-]{36})_(\d{1,3})$/.exec(text ?? '') ?? []
  const recordedAt = new Date(at)
  return Number.isNaN(recordedAt.getTime()) ? undefined : { recordedAt, actId, part: Number(part) }
}
