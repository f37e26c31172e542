import { type CurrentUser, can } from '#app/auth/permissions.ts'
import { findKind } from '#app/care/kinds.ts'
import { isPrintedAlike } from '#app/care/printed.ts'
import { recallOf, recallWords } from '#app/care/recall.ts'
import { env } from '#app/env.server.ts'
import { showDateTime } from '#app/time/display.ts'
import { logLook, type Trace } from '#database/access-log.server.ts'
import { lotDecisions, recalls } from '#database/lot-recalls.server.ts'
import { type LotUse, MOST_LOT_USES, usesOfLot } from '#database/lots.server.ts'

/** Which patients had a lot, as far as this person may see them. */
export interface LotTrace {
  readonly lot: string
  readonly uses: readonly LotUseView[]
  /** Patients of wards that are not this person's: how many, and nothing more. */
  readonly elsewhere: readonly { readonly wardId: string; readonly wardName: string; readonly patients: number }[]
  readonly isWhole: boolean
  readonly lines: readonly string[]
  readonly isRecalled: boolean
  /** What was decided about the lot, the latest first. */
  readonly decisions: readonly string[]
}

export interface LotUseView {
  readonly entryId: string
  readonly patientId: string
  readonly name: string
  readonly recordNumber: string
  readonly where: string
  readonly what: string
  readonly device: string
  readonly at: string
}

/** Traces a lot. Whoever sees patients sees those of their own wards; each ward shown is logged. */
export async function lotTrace(lot: string, user: CurrentUser, by: Trace): Promise<LotTrace> {
  const all = await usesOfLot(lot)
  const isShown = ({ wardId }: LotUse) => can(user, 'see patients', wardId)
  const shown = all.filter(isShown)
  for (const wardId of new Set(shown.map(use => use.wardId))) {
    await logLook({ action: 'traced a lot', purpose: 'TREAT', by, wardId })
  }
  const decisions = (await lotDecisions()).filter(decision => isPrintedAlike(decision.lot, lot))
  return {
    lot,
    uses: shown.map(viewOf),
    elsewhere: countsOf(all.filter(use => !isShown(use))),
    isWhole: all.length < MOST_LOT_USES,
    lines: [...new Set(all.flatMap(({ line }) => line ?? []))].toSorted(),
    isRecalled: recallOf({ lot }, await recalls()) !== undefined,
    decisions: decisions.map(
      ({ isRecalled, line, recalledAt, recalledByName, reason }) =>
        `${isRecalled ? 'Recalled' : 'Recall lifted'}${line ? ` for ${line}` : ''} on ${showDateTime(recalledAt, env.hospitalTimeZone)} by ${recalledByName}: ${reason}`,
    ),
  }
}

/** The lots that are not to be used now, the latest first, with why in words. */
export async function recalledLots(): Promise<readonly { readonly lot: string; readonly says: string }[]> {
  const inForce = await recalls()
  return inForce
    .toSorted((a, b) => b.recalledAt.getTime() - a.recalledAt.getTime())
    .map(recall => ({ lot: recall.lot, says: recallWords(recall, env.hospitalTimeZone) }))
}

function viewOf(use: LotUse): LotUseView {
  return {
    entryId: use.entryId,
    patientId: use.patientId,
    name: `${use.familyName.toUpperCase()}, ${use.givenName}`,
    recordNumber: use.recordNumber,
    where: use.dischargedAt
      ? `${use.wardName}, discharged ${showDateTime(use.dischargedAt, env.hospitalTimeZone)}`
      : `${use.wardName}, bed ${use.bedLabel ?? ''}`,
    what: findKind(use.kind)?.title ?? use.kind,
    device: [use.line, use.size].filter(Boolean).join(' '),
    at: showDateTime(use.performedAt, env.hospitalTimeZone),
  }
}

function countsOf(uses: readonly LotUse[]): LotTrace['elsewhere'] {
  const wards = new Map(uses.map(({ wardId, wardName }) => [wardId, wardName]))
  return [...wards].map(([wardId, wardName]) => {
    const patients = new Set(uses.filter(use => use.wardId === wardId).map(use => use.patientId))
    return { wardId, wardName, patients: patients.size }
  })
}
