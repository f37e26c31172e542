import type { CareContext, StoredEntry } from '#app/care/kind.ts'
import { type Policy, policyInForce } from '#app/care/policy.ts'
import { effectiveEntries, patientRecord, recordUpTo } from '#app/care/record.ts'
import { stomaMadeOn } from '#app/care/tube-change/tube.ts'
import type { PatientBannerView } from '#app/components/patient-banner.tsx'
import { careContext } from '#app/rules/context.ts'
import { ageOn, showDateTime, showDay } from '#app/time/display.ts'
import { earlier, minutes } from '#app/time/duration.ts'
import { localDay } from '#app/time/zone.ts'
import type { PatientCare } from './patient-context.server.ts'

/** Whose page this is, for the top of it. */
export interface PatientHead {
  readonly banner: PatientBannerView
  readonly patientId: string
  /** `Discharged on 01-Dec-2026 14:06.`, or null while the patient is here. */
  readonly discharged: string | null
}

/** Bed, person, and what everybody must know, as words. */
export function patientHead({ record: { patient, stay }, ward, context }: PatientCare, now: Date): PatientHead {
  const made = context ? stomaMadeOn(context) : undefined
  const laryngectomy = patient.upperAirway === 'not open'
  return {
    patientId: patient.id,
    discharged: stay.dischargedAt && `Discharged on ${showDateTime(stay.dischargedAt, ward.zone)}.`,
    banner: {
      bed: stay.bedLabel,
      family: patient.familyName,
      given: patient.givenName,
      sex: capital(patient.sex),
      born: showDay(patient.bornOn),
      age: ageOn(patient.bornOn, localDay(now, ward.zone)),
      recordNo: patient.recordNumber,
      allergies: patient.allergies ?? 'Not asked yet',
      upperAirway: capital(patient.upperAirway),
      stomaMade: made === undefined ? 'Not recorded' : showDay(made),
      oxygen: patient.oxygen ?? 'None prescribed',
      spo2Target:
        patient.spo2Low === null || patient.spo2High === null
          ? 'None prescribed'
          : `${patient.spo2Low} to ${patient.spo2High} %`,
      laryngectomy,
    },
  }
}

const capital = (words: string): string => words.charAt(0).toUpperCase() + words.slice(1)

/** The policy of a patient's ward at a moment; before the first there was, the first one that applies today. */
export function policyAt(policies: readonly Policy[], { ward, context }: PatientCare, at: Date): Policy | undefined {
  return policyInForce(policies, ward.id, at) ?? context?.values.policy
}

/**
 * What rules decide about one act from: what had been done by then (`at`), under the policy of that moment. With `before`,
 * only what had been written down ahead of that entry. Null where no policy was reviewed.
 */
export function contextOfAct(
  care: PatientCare,
  policies: readonly Policy[],
  at: Date,
  before?: StoredEntry,
): CareContext | null {
  const { entries } = care.record
  if (!before) return contextAfter(entries, care, policies, at)
  const known = entries.filter(({ number }) => number < before.number)
  return contextAfter(known, care, policies, at, before.supersedesId)
}

/** The same for an act that takes the place of an entry: that one no longer counts. */
export function contextOfCorrection(
  care: PatientCare,
  policies: readonly Policy[],
  at: Date,
  entryId: string,
): CareContext | null {
  return contextAfter(care.record.entries, care, policies, at, entryId)
}

function contextAfter(
  known: readonly StoredEntry[],
  care: PatientCare,
  policies: readonly Policy[],
  at: Date,
  without: string | null = null,
): CareContext | null {
  const policy = policyAt(policies, care, at)
  if (!policy) return null
  return careContext({ record: recordAfter(known, care, at, without), policy, ward: care.ward, now: at })
}

/** Of the whole chart, that is the record as it is kept, up to `at`: making another of thousands of entries takes longer than the rest. */
function recordAfter(
  known: readonly StoredEntry[],
  { record, context }: PatientCare,
  at: Date,
  without: string | null,
) {
  const { stay, patient, entries } = record
  if (known === entries && without === null && context) {
    const isWhole = allBy(entries, at) && stay.moves.every(move => move.at <= at)
    return isWhole ? context.record : recordUpTo(context.record, at)
  }
  const done = effectiveEntries(known).filter(({ performedAt, id }) => performedAt <= at && id !== without)
  const moves = stay.moves.filter(move => move.at <= at)
  return patientRecord(done, { admittedAt: stay.admittedAt, moves, patient })
}

const MOST_AHEAD = minutes(2) // the table takes no entry that was performed later than that after it was recorded

/** Whether all of them had been performed by then. They are in the order of recording, so the latest few tell. */
function allBy(entries: readonly StoredEntry[], at: Date): boolean {
  const from = earlier(at, MOST_AHEAD)
  const earlierOnes = entries.findLastIndex(({ recordedAt }) => recordedAt < from)
  return entries.slice(earlierOnes + 1).every(({ performedAt }) => performedAt <= at)
}
