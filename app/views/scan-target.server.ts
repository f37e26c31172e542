import { logPatientLook, patientGate } from '#app/auth/patient-access.server.ts'
import type { CurrentUser } from '#app/auth/permissions.ts'
import { returnPath } from '#app/auth/return-to.ts'
import type { AnyCareKind } from '#app/care/kind.ts'
import { findKind } from '#app/care/kinds.ts'
import { itemField } from '#app/charting/item-problems.ts'
import type { Trace } from '#database/access-log.server.ts'
import { type PatientCare, patientCare } from './patient-context.server.ts'

/** The chart form that something is scanned for. */
export interface ScanTarget {
  readonly path: string
  readonly kind: AnyCareKind
  readonly what: string
  readonly care: PatientCare
}

/**
 * The chart form at an address, if this person may chart there; null for an address that is none with something to scan.
 * Throws as `patientGate` does, and logs the look.
 */
export async function scanTarget(
  address: unknown,
  { user, now, by }: { readonly user: CurrentUser; readonly now: Date; readonly by: Trace },
): Promise<ScanTarget | null> {
  const path = returnPath(address, '').split('?')[0] ?? ''
  const [, patientId = '', slug = ''] = /^\/patients\/([0-9a-f-]{36})\/chart\/([a-z-]{1,32})$/i.exec(path) ?? []
  const kind = findKind(slug)
  const field = kind && itemField(kind)
  if (!kind || !field) return null
  const again = `/scan?${new URLSearchParams({ for: path })}`
  const opened = await patientGate(user, patientId, { path: again, act: kind.act ?? 'chart care', by })
  await logPatientLook(opened, by)
  return { path, kind, what: field.meta.of, care: await patientCare(opened.stayId, now) }
}
