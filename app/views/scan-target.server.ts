import { logPatientLook, patientGate } from '#app/auth/patient-access.server.ts'
import type { CurrentUser } from '#app/auth/permissions.ts'
import { returnPath } from '#app/auth/return-to.ts'
import type { AnyCareKind, CareContext } from '#app/care/kind.ts'
import { findKind } from '#app/care/kinds.ts'
import { itemField } from '#app/charting/item-problems.ts'
import { withoutAnswers } from '#app/scanning/form-address.ts'
import type { Trace } from '#database/access-log.server.ts'
import { policies } from '#database/policies.server.ts'
import { entryGate } from './opened-entry.server.ts'
import { contextOfCorrection } from './patient-care.server.ts'
import { patientCare } from './patient-context.server.ts'

/** The form that something is scanned for: that of an act to be charted, or of one that is corrected. */
export interface ScanTarget {
  /** With what the form was opened with, without answers. */
  readonly path: string
  readonly kind: AnyCareKind
  readonly what: string
  readonly bed: string | null
  readonly context: CareContext | null
  /** When the item was used, of an act that is corrected; null: it is still in the hand. */
  readonly usedAt: Date | null
}

interface Asking {
  readonly user: CurrentUser
  readonly now: Date
  readonly by: Trace
}

/**
 * The form at an address, if this person may chart or correct there; null for an address that is none with something to scan.
 * Throws as `patientGate` does, and logs the look.
 */
export async function scanTarget(address: unknown, asking: Asking): Promise<ScanTarget | null> {
  const path = withoutAnswers(returnPath(address, ''))
  const [pathname = ''] = path.split('?')
  const [, patientId, slug = ''] = /^\/patients\/([0-9a-f-]{36})\/chart\/([a-z-]{1,32})$/i.exec(pathname) ?? []
  if (patientId !== undefined) return chartTarget(path, patientId, slug, asking)
  const [, entryId] = /^\/entries\/([0-9a-f-]{36})\/correct$/i.exec(pathname) ?? []
  return entryId === undefined ? null : correctionTarget(path, entryId, asking)
}

async function chartTarget(path: string, patientId: string, slug: string, { user, now, by }: Asking) {
  const kind = findKind(slug)
  const field = kind && itemField(kind)
  if (!kind || !field) return null
  const opened = await patientGate(user, patientId, { path: scanPath(path), act: kind.act ?? 'chart care', by })
  await logPatientLook(opened, by)
  const { record, context } = await patientCare(opened.stayId, now)
  return { path, kind, what: field.meta.of, bed: record.stay.bedLabel, context, usedAt: null }
}

async function correctionTarget(path: string, entryId: string, { user, now, by }: Asking) {
  const { entry, opened } = await entryGate(user, entryId, { act: 'correct', path: scanPath(path), by })
  const kind = findKind(entry.kind)
  const field = kind && itemField(kind)
  if (!kind || !field) return null
  await logPatientLook(opened, by)
  const care = await patientCare(entry.stayId, now)
  const context = contextOfCorrection(care, await policies(), entry.performedAt, entry.id)
  return { path, kind, what: field.meta.of, bed: care.record.stay.bedLabel, context, usedAt: entry.performedAt }
}

const scanPath = (path: string): string => `/scan?${new URLSearchParams({ for: path })}`
