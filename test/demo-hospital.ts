import type { BedMove, CareContext } from '#app/care/kind.ts'
import { policyInForce } from '#app/care/policy.ts'
import { patientRecord } from '#app/care/record.ts'
import { careContext } from '#app/rules/context.ts'
import { dueTasks } from '#app/rules/due-tasks.ts'
import type { TaskStatus } from '#app/rules/status.ts'
import type { DemoHospital, DemoStay } from '#database/seeders/rows.ts'

/** What a rule decides from for one stay of a demo hospital, at the moment of its seeding. Throws where rows do not fit together. */
export function contextOf(hospital: DemoHospital, stay: DemoStay): CareContext {
  const { seededAt: now, zone } = hospital
  const ward = found(hospital.wards, stay.wardId)
  const policy = policyInForce(hospital.policies, ward.id, now)
  if (!policy) throw new Error(`${ward.name} has no policy`)
  const entries = hospital.entries.filter(entry => entry.stayId === stay.id)
  const patient = found(hospital.patients, stay.patientId)
  const moves = movesOf(hospital, stay)
  const record = patientRecord(entries, { admittedAt: stay.admittedAt, moves, patient })
  return careContext({ record, policy, ward: { ...ward, zone }, now })
}

/** The moves of a stay after its admission. */
function movesOf({ moves, wards, beds }: DemoHospital, { id }: DemoStay): readonly BedMove[] {
  const places = moves.filter(({ stayId }) => stayId === id)
  return places.slice(1).map(({ wardId, bedId, movedAt }, before) => ({
    at: movedAt,
    bed: found(beds, bedId).label,
    ward: wardId === places[before]?.wardId ? null : found(wards, wardId).name,
  }))
}

/** The stays that show on the board of a ward. */
export function present(hospital: DemoHospital, wardName: string): readonly DemoStay[] {
  const ward = hospital.wards.find(({ name }) => name === wardName)
  return hospital.stays.filter(stay => stay.wardId === ward?.id && stay.dischargedAt === null)
}

/** How many tasks of a ward's patients stand how. */
export function standings(hospital: DemoHospital, wardName: string): Partial<Record<TaskStatus, number>> {
  const counts: Partial<Record<TaskStatus, number>> = {}
  for (const stay of present(hospital, wardName)) {
    for (const { status } of dueTasks(contextOf(hospital, stay))) counts[status] = (counts[status] ?? 0) + 1
  }
  return counts
}

function found<Row extends { readonly id: string }>(rows: readonly Row[], id: string): Row {
  const row = rows.find(other => other.id === id)
  if (!row) throw new Error(`No row ${id}`)
  return row
}
