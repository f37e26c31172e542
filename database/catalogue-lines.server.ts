import type { LineValues } from '#app/catalogue/line-schema.ts'
import { isUniqueViolation } from './errors.server.ts'
import { CatalogueChangeRow } from './models/catalogue-change.server.ts'
import { change, select, transact } from './sequelize.server.ts'
import { raiseAllWards } from './ward-revs.server.ts'

/** A line with the names it had before, oldest first, and how many items it has, retired ones too. */
export interface StoredLine {
  readonly id: string
  readonly line: string
  readonly maker: string
  readonly formerNames: readonly string[]
  readonly tubes: number
  readonly innerCannulas: number
}

/** A line by its id. */
export async function lineById(id: string): Promise<StoredLine | undefined> {
  const [line] = await select<StoredLine>(
    `SELECT l.id, l.name AS line, l.maker, l.former_names AS formerNames,
       (SELECT COUNT(*) FROM tubes t WHERE t.line_id = l.id) AS tubes,
       (SELECT COUNT(*) FROM inner_cannulas c WHERE c.line_id = l.id) AS innerCannulas
     FROM tube_lines l WHERE l.id = :id`,
    { id },
  )
  return line
}

/** Every name that a line has or had, by line: only lines that were renamed. */
export async function namesOfRenamedLines(): Promise<readonly (readonly string[])[]> {
  const rows = await select<{ name: string; formerNames: readonly string[] }>(
    'SELECT name, former_names AS formerNames FROM tube_lines WHERE JSON_LENGTH(former_names) > 0',
  )
  return rows.map(({ name, formerNames }) => [name, ...formerNames])
}

/** What came of naming a line: `name taken` by another one. */
export type LineNaming = 'named' | 'name taken' | 'changed meanwhile'

/**
 * Names a line and its maker anew, for all of its items, and notes who did. What was charted stays as it was written. Boards look
 * again: a recall of the line is one under each of its names.
 */
export async function nameLine(id: string, values: LineValues, by: string): Promise<LineNaming> {
  try {
    return await transact(async transaction => {
      const { line, maker, wasLine, wasMaker } = values
      const named = await change(
        `UPDATE tube_lines SET former_names = IF(BINARY name = BINARY :line, former_names, JSON_ARRAY_APPEND(former_names, '$', name)),
           name = :line, maker = :maker
         WHERE id = :id AND BINARY name = BINARY :wasLine AND BINARY maker = BINARY :wasMaker`,
        { id, line, maker, wasLine, wasMaker },
        transaction,
      )
      if (named === 0) return 'changed meanwhile'
      const before = { line: wasLine, maker: wasMaker }
      const differing = (['line', 'maker'] as const).filter(name => before[name] !== values[name])
      if (differing.length === 0) return 'named'
      const only = (of: typeof before) => Object.fromEntries(differing.map(name => [name, of[name]]))
      const changes = { oldValues: only(before), newValues: only({ line, maker }) }
      await CatalogueChangeRow.create(
        { subject: 'line', subjectId: id, what: 'line changed', changedBy: by, ...changes },
        { transaction },
      )
      await raiseAllWards(transaction)
      return 'named'
    })
  } catch (error) {
    if (isUniqueViolation(error, 'tube_lines_name')) return 'name taken'
    throw error
  }
}
