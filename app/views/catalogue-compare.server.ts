import { data } from 'react-router'
import { logPatientLook, patientGate } from '#app/auth/patient-access.server.ts'
import type { CurrentUser } from '#app/auth/permissions.ts'
import { policyInForce, type Values, valuesFor } from '#app/care/policy.ts'
import { catheterRule } from '#app/care/suction/catheter.ts'
import { tubeInPlace } from '#app/care/tube-change/tube.ts'
import { breathedIdMm, type ComparedTube, comparedOf, nearest, tubeCatheters } from '#app/catalogue/compare.ts'
import type { CatalogueTube } from '#app/catalogue/item.ts'
import type { Trace } from '#database/access-log.server.ts'
import { catalogueTube, tubesWhere } from '#database/catalogue.server.ts'
import { policies } from '#database/policies.server.ts'
import { patientCare } from './patient-context.server.ts'

const MOST_CANDIDATES = 30
const UUID = /^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}$/

/** The tube that others are laid beside, and the values by which its catheters are chosen; null: no policy was reviewed. */
interface Present {
  readonly tube: ComparedTube
  readonly tubeId: string | null
  /** The patient whose tube it is. */
  readonly patientId: string | null
  readonly values: Values | null
}

interface Ask {
  readonly params: URLSearchParams
  readonly path: string
  readonly user: CurrentUser
  readonly by: Trace
}

/** Tubes of the catalogue beside the one that an address names, nearest first; null when it names none. */
export async function tubesCompared(ask: Ask, now: Date) {
  const present = await presentOf(ask, now)
  if (!present) return null
  const { tube, tubeId, patientId, values } = present
  const rule = values && catheterRule(values)
  const candidates = await nearestStored(tube, tubeId)
  const catheters = (one: ComparedTube) => rule && tubeCatheters(one, rule)
  return {
    present: { tube, tubeId, patientId, catheters: catheters(tube) },
    rule: rule && { ratio: rule.ratio, strict: rule.strict, stockedFr: [...rule.stockedFr] },
    candidates: nearest(tube, candidates).map(one => ({ ...one, catheters: catheters(one.tube) })),
  }
}

/** As many as can be read, chosen by the same order that they are shown in. */
async function nearestStored(tube: ComparedTube, tubeId: string | null): Promise<readonly CatalogueTube[]> {
  return tubesWhere(
    'i.retired_at IS NULL AND (:tubeId IS NULL OR i.id <> :tubeId)',
    { tubeId, od: tube.od, id: breathedIdMm(tube), length: tube.lengthMm, limit: MOST_CANDIDATES },
    `ABS(i.od - :od), ABS(COALESCE(i.id_with_inner, i.id_without_inner) - :id), ABS(i.length_mm - :length), i.id LIMIT :limit`,
  )
}

async function presentOf(ask: Ask, now: Date): Promise<Present | null> {
  const patientId = ask.params.get('patient')
  if (patientId !== null) return patientsTube(patientId, ask, now)
  const id = ask.params.get('tube')
  if (id === null) return null
  const tube = UUID.test(id) ? await catalogueTube(id) : undefined
  if (!tube) throw data('There is no such tube in the catalogue.', 404)
  const policy = policyInForce(await policies(), ask.user.wardIds[0] ?? '', now)
  return { tube, tubeId: id, patientId: null, values: policy ? valuesFor(policy) : null }
}

/** The tube in place, in the numbers that were charted. Opens the patient as their own pages do, and logs the look. */
async function patientsTube(patientId: string, { path, user, by }: Ask, now: Date): Promise<Present> {
  const opened = await patientGate(user, patientId, { path, act: 'see patients', by })
  await logPatientLook(opened, by)
  const { context } = await patientCare(opened.stayId, now)
  const tube = context && tubeInPlace(context.record)?.data
  if (!tube) throw data('There is no tube in place to compare with.', 404)
  return { tube: comparedOf(tube), tubeId: null, patientId, values: context.values }
}
