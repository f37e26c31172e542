import { findKind } from '#app/care/kinds.ts'
import { supervisedRole } from '#app/care/supervision.ts'
import { earlier, hours } from '#app/time/duration.ts'
import type { DemoEntry, DemoPerson, DemoStay } from './rows.ts'

const BACK = hours(12)
const EVERY = 12 // of a nurse's usual acts, one is the student's

/** Gives some of the last hours' usual acts on a student's ward to the student, with the nurse as the second person. */
export function withStudents(
  entries: readonly DemoEntry[],
  people: readonly DemoPerson[],
  stays: readonly DemoStay[],
  now: Date,
): readonly DemoEntry[] {
  const students = people.filter(({ supervised }) => supervised)
  const superseded = new Set(entries.map(({ supersedesId }) => supersedesId))
  const isUsual = ({ id, kind, supersedesId, recordedRole, performedAt }: DemoEntry) => {
    const about = findKind(kind)
    const isPlain = about?.needsFreshSignIn !== true && about?.act === undefined
    const stands = supersedesId === null && !superseded.has(id)
    return isPlain && stands && recordedRole === 'nurse' && performedAt > earlier(now, BACK)
  }
  const counts = new Map<string, number>()
  return entries.map(entry => {
    const ward = stays.find(({ id }) => id === entry.stayId)?.wardId ?? ''
    const student = students.find(({ wardIds }) => wardIds.includes(ward))
    if (!student || !isUsual(entry)) return entry
    const count = (counts.get(ward) ?? 0) + 1
    counts.set(ward, count)
    return count % EVERY === 0 ? byStudent(entry, student) : entry
  })
}

function byStudent(entry: DemoEntry, student: DemoPerson): DemoEntry {
  return {
    ...entry,
    recordedById: student.id,
    recordedByName: student.name,
    recordedRole: supervisedRole(student.role),
    witnessId: entry.recordedById,
    witnessName: entry.recordedByName,
  }
}
