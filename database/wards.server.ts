import type { Transaction } from 'sequelize'
import type { EmergencyNumber } from '#app/care/emergency.ts'
import type { PressureUnit } from '#app/clinical/units.ts'
import type { ShiftTimes } from '#app/time/shift.ts'
import { isUniqueViolation } from './errors.server.ts'
import { WardRow } from './models/ward.server.ts'
import { noteChange } from './record-changes.server.ts'
import { select, transact } from './sequelize.server.ts'
import { raiseWards } from './ward-revs.server.ts'

/** A ward. Retired ones take no patients and are kept for the stays that were there. */
export type Ward = {
  readonly id: string
  readonly name: string
  readonly shiftTimes: ShiftTimes
  readonly pressureUnit: PressureUnit
  readonly retired: boolean
  /** Whom the ward calls, in the order of its bed-head signs. */
  readonly emergencyNumbers: readonly EmergencyNumber[]
}

/** A ward as a form describes it; without numbers it keeps those that it has. */
export type NewWard = Omit<Ward, 'retired' | 'emergencyNumbers'> & Partial<Pick<Ward, 'emergencyNumbers'>>

export type WardChange =
  | { readonly outcome: 'saved' }
  | { readonly outcome: 'name taken' | 'has patients' | 'not there' }

type Columns = Omit<Ward, 'retired'> & { retired: number }

const COLUMNS =
  'id, name, shift_times AS shiftTimes, pressure_unit AS pressureUnit, retired, emergency_numbers AS emergencyNumbers'

const wardOf = (row: Columns): Ward => ({ ...row, retired: Boolean(row.retired) })

/** Every ward by name, with the number of its beds in use and of its patients now; those in use first. */
export async function allWards(): Promise<readonly (Ward & { readonly beds: number; readonly patients: number })[]> {
  const rows = await select<Columns & { beds: number; patients: number }>(
    `SELECT ${COLUMNS}, (SELECT COUNT(*) FROM beds b WHERE b.ward_id = w.id AND NOT b.retired) AS beds,
       (SELECT COUNT(*) FROM stays s WHERE s.ward_id = w.id AND s.discharged_at IS NULL) AS patients
     FROM wards w ORDER BY retired, name`,
  )
  return rows.map(row => ({ ...row, ...wardOf(row) }))
}

/** A ward by its id, retired or not. */
export async function wardById(id: string): Promise<Ward | undefined> {
  const [row] = await select<Columns>(`SELECT ${COLUMNS} FROM wards WHERE id = :id`, { id })
  return row && wardOf(row)
}

/** Adds a ward under an id that was minted when the form was opened: the same form twice adds one. */
export async function addWard(ward: NewWard, by: string): Promise<WardChange> {
  try {
    return await transact(async transaction => {
      await WardRow.create({ ...ward }, { transaction })
      await raiseWards([ward.id], transaction)
      await noteChange(
        { subject: 'ward', subjectId: ward.id, what: 'ward added', by, old: null, new: ward },
        transaction,
      )
      return { outcome: 'saved' }
    })
  } catch (error) {
    if (isUniqueViolation(error, 'wards_name'))
      return (await isSameWard(ward)) ? { outcome: 'saved' } : { outcome: 'name taken' }
    if (isUniqueViolation(error, 'PRIMARY'))
      return (await isSameWard(ward)) ? { outcome: 'saved' } : { outcome: 'not there' }
    throw error
  }
}

async function isSameWard(ward: NewWard) {
  const found = await wardById(ward.id)
  return found?.name === ward.name
}

/** Changes a ward. One that has patients cannot be retired. */
export async function changeWard(ward: NewWard & Pick<Ward, 'retired'>, by: string): Promise<WardChange> {
  try {
    return await transact(async transaction => {
      const row = await WardRow.findByPk(ward.id, { transaction, lock: true })
      if (!row) return { outcome: 'not there' }
      if (ward.retired && !row.retired && (await hasPatients(ward.id, transaction))) return { outcome: 'has patients' }
      const old = { ...row.get({ plain: true }) }
      await row.update({ ...ward }, { transaction })
      await noteChange({ subject: 'ward', subjectId: ward.id, what: 'ward changed', by, old, new: ward }, transaction)
      await raiseWards([ward.id], transaction)
      return { outcome: 'saved' }
    })
  } catch (error) {
    if (isUniqueViolation(error, 'wards_name')) return { outcome: 'name taken' }
    throw error
  }
}

async function hasPatients(wardId: string, transaction: Transaction) {
  const open = await select(
    'SELECT 1 FROM stays WHERE ward_id = :wardId AND discharged_at IS NULL LIMIT 1',
    { wardId },
    transaction,
  )
  return open.length > 0
}
