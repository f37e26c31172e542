import { later, minutes } from '#app/time/duration.ts'
import type { Bedside, Place } from './bedside.ts'
import type { DemoChange, DemoMove, DemoPatient, DemoStay } from './rows.ts'

/** What was noted of a stay besides care, oldest first: the patient added and admitted, moved, discharged. */
export function changesOf(
  bedside: Bedside,
  { patient, stay, moves }: { patient: DemoPatient; stay: DemoStay; moves: readonly DemoMove[] },
): readonly DemoChange[] {
  const { admittedAt, place, earlierPlace } = bedside
  const first = earlierPlace ?? place
  const { id: stayId, patientId, dischargedAt, dischargeReason, dischargeNote } = stay
  const changedBy = onDuty(bedside, first, admittedAt)
  const admission = { id: stayId, patientId, ...bedOf(first), admittedAt }
  const { id, ...details } = patient
  const changes: DemoChange[] = [
    noted('patient', id, 'patient added', changedBy, admittedAt, null, { id, ...details }),
    noted('stay', stayId, 'admitted', changedBy, admittedAt, null, admission),
    ...moves
      .slice(1)
      .map(({ recordedBy, movedAt, wardId, bedId }) =>
        noted('stay', stayId, 'moved', recordedBy, movedAt, bedOf(first), { wardId, bedId, movedAt }),
      ),
  ]
  if (!dischargedAt) return changes
  const before = { dischargedAt: null, dischargeReason: null, dischargeNote: null }
  const after = { dischargedAt, dischargeReason, dischargeNote }
  return [
    ...changes,
    noted('stay', stayId, 'discharged', onDuty(bedside, place, dischargedAt), dischargedAt, before, after),
  ]
}

function noted(
  subject: DemoChange['subject'],
  subjectId: string,
  what: string,
  changedBy: string,
  changedAt: Date,
  oldValues: DemoChange['oldValues'],
  newValues: DemoChange['newValues'],
): DemoChange {
  return { subject, subjectId, what, changedBy, changedAt, oldValues, newValues }
}

const bedOf = ({ ward, bed }: Place) => ({ wardId: ward.row.id, bedId: bed.id })

/** The nurse who had a bed, just after a moment: somebody who comes at a change of shift is received by the new one. */
export function onDuty({ rota }: Bedside, { ward, bed }: Place, at: Date): string {
  return rota.nurse(ward, bed, later(at, minutes(1))).id
}
