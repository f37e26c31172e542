const MARK = ' under supervision'

/** The role that an entry keeps of somebody who charts under supervision, such as a student: `nurse under supervision`. */
export function supervisedRole(role: string): string {
  return role + MARK
}

/** Whether an entry with this role waits for a registered colleague to countersign it. */
export function isUnderSupervision(recordedRole: string): boolean {
  return recordedRole.endsWith(MARK)
}
