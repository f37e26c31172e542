import { data } from 'react-router'
import { validate as isUuid } from 'uuid'
import { type LineNaming, lineById, type StoredLine } from '#database/catalogue-lines.server.ts'

/** The line of an address. Throws a 404 when there is none. */
export async function lineOr404(id: string): Promise<StoredLine> {
  const line = isUuid(id) ? await lineById(id) : undefined
  if (!line) throw data('There is no such line in the catalogue.', 404)
  return line
}

const MEANWHILE = 'Somebody else changed this line meanwhile. Open it again, and copy what you typed.'

/** Why a line was not named so, at the field or of the whole form. */
export const lineRefusals = {
  'name taken': { status: 400, fieldErrors: { line: ['Another line of the catalogue has this name'] } },
  'changed meanwhile': { status: 409, formErrors: [MEANWHILE] },
} satisfies Record<Exclude<LineNaming, 'named'>, unknown>
