import { isUniqueViolation } from './errors.server.ts'
import { BedRow } from './models/bed.server.ts'
import { noteChange } from './record-changes.server.ts'
import { select, transact } from './sequelize.server.ts'
import { raiseWards } from './ward-revs.server.ts'

/** A bed of a ward; `position` orders the board. */
export type Bed = {
  readonly id: string
  readonly wardId: string
  readonly label: string
  readonly position: number
  readonly retired: boolean
}

/** A bed that a patient may come to. */
export type FreeBed = Pick<Bed, 'id' | 'wardId' | 'label'> & { readonly wardName: string }

export type BedChange = { readonly outcome: 'saved' | 'label taken' | 'occupied' | 'not there' }

/** The beds of a ward in their order, with whether somebody lies there now; those in use first. */
export async function bedsOf(wardId: string): Promise<readonly (Bed & { readonly occupied: boolean })[]> {
  const rows = await select<Omit<Bed, 'retired'> & { retired: number; occupied: number }>(
    `SELECT b.id, b.ward_id AS wardId, b.label, b.position, b.retired, s.id IS NOT NULL AS occupied
     FROM beds b LEFT JOIN stays s ON s.occupied_bed_id = b.id
     WHERE b.ward_id = :wardId ORDER BY b.retired, b.position, b.label`,
    { wardId },
  )
  return rows.map(row => ({ ...row, retired: Boolean(row.retired), occupied: Boolean(row.occupied) }))
}

/** The free beds of a ward, or of all wards when none is named, by ward and in their order. */
export async function freeBeds(wardId?: string): Promise<readonly FreeBed[]> {
  return select<FreeBed>(
    `SELECT b.id, b.ward_id AS wardId, b.label, w.name AS wardName
     FROM beds b JOIN wards w ON w.id = b.ward_id LEFT JOIN stays s ON s.occupied_bed_id = b.id
     WHERE s.id IS NULL AND NOT b.retired AND NOT w.retired ${wardId === undefined ? '' : 'AND b.ward_id = :wardId'}
     ORDER BY w.name, w.id, b.position, b.label`,
    wardId === undefined ? {} : { wardId },
  )
}

/** Adds a bed behind the others of its ward, under an id minted when the form was opened: the same form twice adds one. */
export async function addBed(bed: Pick<Bed, 'id' | 'wardId' | 'label'>, by: string): Promise<BedChange> {
  try {
    return await transact(async transaction => {
      const [last] = await select<{ position: number | null }>(
        'SELECT MAX(position) AS position FROM beds WHERE ward_id = :wardId',
        { wardId: bed.wardId },
        transaction,
      )
      const added = { ...bed, position: (last?.position ?? 0) + 1 }
      await BedRow.create(added, { transaction })
      await noteChange({ subject: 'bed', subjectId: bed.id, what: 'bed added', by, old: null, new: added }, transaction)
      await raiseWards([bed.wardId], transaction)
      return { outcome: 'saved' }
    })
  } catch (error) {
    if (!isUniqueViolation(error, 'PRIMARY') && !isUniqueViolation(error, 'beds_label')) throw error
    const beds = await bedsOf(bed.wardId)
    const isThere = beds.some(known => known.id === bed.id && known.label === bed.label)
    return { outcome: isThere ? 'saved' : 'label taken' }
  }
}

/** Changes a bed of that ward. One that somebody lies in cannot be retired. */
export async function changeBed(bed: Bed, by: string): Promise<BedChange> {
  try {
    return await transact(async transaction => {
      const row = await BedRow.findOne({ where: { id: bed.id, wardId: bed.wardId }, transaction, lock: true })
      if (!row) return { outcome: 'not there' }
      const occupied = await select('SELECT 1 FROM stays WHERE occupied_bed_id = :id', { id: bed.id }, transaction)
      if (bed.retired && occupied.length > 0) return { outcome: 'occupied' }
      const old = { ...row.get({ plain: true }) }
      await row.update({ ...bed }, { transaction })
      await noteChange({ subject: 'bed', subjectId: bed.id, what: 'bed changed', by, old, new: bed }, transaction)
      await raiseWards([bed.wardId], transaction)
      return { outcome: 'saved' }
    })
  } catch (error) {
    if (isUniqueViolation(error, 'beds_label')) return { outcome: 'label taken' }
    throw error
  }
}
