import type { CareContext, Entry, PatientRecord } from '../kind.ts'
import { suturesIn } from '../tube-change/tasks.ts'
import { tubeInPlace } from '../tube-change/tube.ts'
import { bedHeadSigns, type SignData } from './schema.ts'

/** What a sign shows of a patient. */
export type SignFacts = Omit<SignData, 'act'>

/** Whether a sign belongs at this bed: for a tube in place and, tube or none, after a laryngectomy. */
export function needsSign(record: PatientRecord): boolean {
  return tubeInPlace(record) !== undefined || record.patient.upperAirway === 'not open'
}

/** What a sign that is printed now would show. Every change of it ends the sign that hangs at the bed. */
export function signFacts({ record }: Pick<CareContext, 'record'>): SignFacts {
  const { upperAirway, laryngoscopy, airwayNotes, bed, identity } = record.patient
  const tube = tubeInPlace(record)
  return {
    form: upperAirway,
    ...(tube ? { tube: tube.id, sutures: suturesIn({ record }) ? 'yes' : 'no' } : {}),
    ...(laryngoscopy ? { laryngoscopy } : {}),
    ...(airwayNotes ? { airwayNotes } : {}),
    ...(bed ? { bed } : {}),
    ...(identity ? { identity } : {}),
  }
}

/** The sign that was printed last; undefined when none was, or it has been taken down. */
export function printedSign(record: PatientRecord): Entry<SignData> | undefined {
  const last = record.latest(bedHeadSigns)
  return last?.data.act === 'taken down' ? undefined : last
}

/** What has changed since a sign was printed, in words; none when it is current. */
export function changedSince(sign: SignData, context: Pick<CareContext, 'record'>): readonly string[] {
  const now = signFacts(context)
  return [
    ...(sign.tube === now.tube
      ? []
      : [now.tube === undefined ? 'the tube is out' : 'the tube or what is charted of it']),
    ...(sign.form === now.form ? [] : ['the upper airway']),
    ...(sign.tube === now.tube && sign.sutures !== now.sutures ? ['the flange sutures'] : []),
    ...(sign.laryngoscopy === now.laryngoscopy ? [] : ['the view at laryngoscopy']),
    ...(sign.airwayNotes === now.airwayNotes ? [] : ['the known problems of the airway']),
    ...(isOther(sign.bed, now.bed) ? ['the bed'] : []),
    ...(isOther(sign.identity, now.identity) ? ['the name, birth or record number'] : []),
  ]
}

/** Signs of before these were kept say nothing of them. */
function isOther(shown: string | undefined, now: string | undefined): boolean {
  return shown !== undefined && now !== undefined && shown !== now
}
