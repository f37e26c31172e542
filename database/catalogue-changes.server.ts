import type { Transaction } from 'sequelize'
import { type Cells, type Column, columns, type ItemKind } from '#app/catalogue/columns.ts'
import { CatalogueChangeRow } from './models/catalogue-change.server.ts'
import { select } from './sequelize.server.ts'

type Some = Readonly<Partial<Record<Column, string>>>

/** One change of an item, with what it said before (null: it was new) and after. Only what changed, by column. */
export interface CatalogueChange {
  readonly id: number
  readonly what: string
  readonly changedAt: Date
  readonly changedByName: string
  readonly oldValues: Some | null
  readonly newValues: Some
}

/** An item before and after a change, as cells; null before: it is new. */
export interface BeforeAndAfter {
  readonly before: Cells | null
  readonly after: Cells
}

/** Notes changes in the transaction that makes them. Nothing is noted of an item that stays as it is. */
export async function noteCatalogueChanges(
  items: readonly BeforeAndAfter[],
  by: string,
  transaction: Transaction,
): Promise<void> {
  const rows = items.flatMap(({ before, after }) => {
    const differing = columns.filter(column => (before ? before[column] !== after[column] : after[column] !== ''))
    if (differing.length === 0) return []
    const only = (cells: Cells) => Object.fromEntries(differing.map(column => [column, cells[column]]))
    const subject: ItemKind = after.item === 'tube' ? 'tube' : 'inner cannula'
    const what = `${subject} ${actOf(before, after)}`
    return [
      { subject, subjectId: after.id, what, changedBy: by, oldValues: before && only(before), newValues: only(after) },
    ]
  })
  await CatalogueChangeRow.bulkCreate(rows, { transaction })
}

function actOf(before: Cells | null, after: Cells): string {
  if (!before) return 'added'
  if (before.retired === after.retired) return 'changed'
  return after.retired === 'yes' ? 'retired' : 'put in use again'
}

/** The latest changes of an item, and of whatever else is named, newest first: at most 200. */
export async function catalogueChangesOf(...subjectIds: readonly string[]): Promise<readonly CatalogueChange[]> {
  return select<CatalogueChange>(
    `SELECT c.id, c.what, c.changed_at AS changedAt, u.name AS changedByName, c.old_values AS oldValues, c.new_values AS newValues
     FROM catalogue_changes c JOIN users u ON u.id = c.changed_by
     WHERE c.subject_id IN (:subjectIds) ORDER BY c.id DESC LIMIT 200`,
    { subjectIds },
  )
}
