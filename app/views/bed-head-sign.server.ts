import { changedSince, needsSign, printedSign, signFacts } from '#app/care/bed-head-sign/current.ts'
import type { SignData } from '#app/care/bed-head-sign/schema.ts'
import { type BedHeadSign, bedHeadSign } from '#app/rules/bed-head-sign.ts'
import { showDateTime } from '#app/time/display.ts'
import { wardById } from '#database/wards.server.ts'
import { tubeFacts } from './emergency.server.ts'
import type { PatientCare } from './patient-context.server.ts'

/** The sign of a patient as it would be printed, or why there is none to print. */
export type SignView =
  | { readonly sign: BedHeadSign; readonly facts: Omit<SignData, 'act'>; readonly none?: never }
  | { readonly sign: null; readonly facts: Omit<SignData, 'act'>; readonly none: string }

/** How the sign that hangs at the bed stands. */
export interface HangingSign {
  readonly entryId: string
  readonly printedAt: Date
  readonly says: string
  /** What changed since it was printed; none when it is current. */
  readonly changed: readonly string[]
}

/** The sign of one patient at the moment of `care`, stamped `printedAt`. */
export async function signOf(care: PatientCare, printedAt: Date): Promise<SignView> {
  const { record, context, ward } = care
  if (!context) {
    const none = 'This ward has no reviewed policy, so no sign can be made. Use the airway emergency steps.'
    return { sign: null, facts: { form: record.patient.upperAirway }, none }
  }
  const facts = signFacts(context)
  if (record.stay.dischargedAt) return { sign: null, facts, none: 'The patient is not here any more.' }
  if (!needsSign(context.record)) return { sign: null, facts, none: 'No tube is charted as in place.' }
  const { patient, stay } = record
  const person = { ...patient, bed: stay.bedLabel, ward: ward.name }
  const numbers = (await wardById(ward.id))?.emergencyNumbers ?? []
  return { sign: bedHeadSign(context, person, { numbers, facts: tubeFacts(context), printedAt }), facts }
}

/** The sign that was printed last and not taken down since; null when there is none. */
export function hangingSign({ context, ward }: PatientCare): HangingSign | null {
  const sign = context && printedSign(context.record)
  if (!context || !sign) return null
  const when = showDateTime(sign.performedAt, ward.zone)
  return {
    entryId: sign.id,
    printedAt: sign.performedAt,
    says: `Printed ${when} by ${sign.recordedByName}, ${sign.recordedRole}.`,
    changed: changedSince(sign.data, context),
  }
}
