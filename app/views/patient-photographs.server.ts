import type { AnyCareKind, Entry } from '#app/care/kind.ts'
import { careKinds } from '#app/care/kinds.ts'
import { photographFields, photographsIn } from '#app/care/photographs.ts'
import { patientRecord } from '#app/care/record.ts'
import { showDateTime } from '#app/time/display.ts'
import type { PatientCare } from './patient-context.server.ts'

/** One look with its photographs. */
export interface PhotographedLook {
  readonly entryId: string
  readonly when: string
  readonly title: string
  readonly sentence: string
  readonly photographs: readonly string[]
}

const photographedKinds = careKinds.filter(kind => photographFields(kind).length > 0)

/** Every look of this stay that counts and has photographs, latest first. */
export function photographedLooks({ record, ward }: PatientCare): readonly PhotographedLook[] {
  const asked = patientRecord(record.entries, { admittedAt: record.stay.admittedAt, patient: record.patient })
  return photographedKinds
    .flatMap((kind: AnyCareKind) => asked.of(kind).map((entry: Entry) => ({ kind, entry })))
    .flatMap(({ kind, entry }) => {
      const photographs = photographsIn(kind, entry.data)
      return photographs.length === 0 ? [] : [{ kind, entry, photographs }]
    })
    .toSorted((a, b) => b.entry.performedAt.getTime() - a.entry.performedAt.getTime())
    .map(({ kind, entry, photographs }) => ({
      entryId: entry.id,
      when: showDateTime(entry.performedAt, ward.zone),
      title: kind.title,
      sentence: kind.summary(entry.data),
      photographs,
    }))
}
