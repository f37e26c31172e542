import { policyInForce } from '#app/care/policy.ts'
import { env } from '#app/env.server.ts'
import { type TubeRow, tubeRow } from '#app/rules/tube-row.ts'
import { policies } from '#database/policies.server.ts'
import { recordsOfWards } from '#database/records.server.ts'
import { allWards } from '#database/wards.server.ts'
import { contextOf } from './care-of.server.ts'

/** A tube in place, with the bed and the person it belongs to. */
export interface ListedTube extends TubeRow {
  readonly patientId: string
  readonly wardId: string
  readonly wardName: string
  readonly bed: string
  readonly familyName: string
  readonly givenName: string
}

/** Every tube in place on these wards, the one to be changed first at the top. Wards without a reviewed policy show none. */
export async function tubesOfWards(wardIds: readonly string[], now: Date): Promise<readonly ListedTube[]> {
  const [records, known, wards] = await Promise.all([recordsOfWards(wardIds), policies(), allWards()])
  const facts = new Map(wards.map(ward => [ward.id, { ...ward, zone: env.hospitalTimeZone }]))
  return records
    .flatMap(record => {
      const ward = facts.get(record.stay.wardId)
      const policy = policyInForce(known, record.stay.wardId, now)
      const row = ward && policy && tubeRow(contextOf(record, { policy, ward, now }))
      if (!row) return []
      const { patient, stay } = record
      const { familyName, givenName } = patient
      return [
        {
          ...row,
          familyName,
          givenName,
          patientId: patient.id,
          wardId: stay.wardId,
          wardName: stay.wardName,
          bed: stay.bedLabel,
        },
      ]
    })
    .toSorted((a, b) => byDay(a.changeBy, b.changeBy))
}

/** The earlier day first, and tubes without a day last. */
function byDay(a: string | null, b: string | null): number {
  if (a === b) return 0
  if (a === null || b === null) return a === null ? 1 : -1
  return a < b ? -1 : 1
}
