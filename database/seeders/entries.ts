import type { Role } from '#app/auth/permissions.ts'
import { versionOf } from '#app/care/payload.ts'
import { later, minutes } from '#app/time/duration.ts'
import { answersTo } from './answers.ts'
import { type Bedside, placeAt } from './bedside.ts'
import { aboveCuffCare } from './chart-above-cuff.ts'
import { removalCare } from './chart-after-removal.ts'
import { cuffCare } from './chart-cuff.ts'
import { humidificationCare } from './chart-humidification.ts'
import { innerCannulaCare } from './chart-inner-cannula.ts'
import { kitCare } from './chart-kit.ts'
import { observationCare } from './chart-observations.ts'
import { oralCare } from './chart-oral-care.ts'
import { signCare } from './chart-sign.ts'
import { stomaCare } from './chart-stoma.ts'
import { suctionCare } from './chart-suction.ts'
import { tieCare } from './chart-ties.ts'
import { tubeCare } from './chart-tube.ts'
import { waterCuffCare } from './chart-water-cuff.ts'
import type { Draft } from './draft.ts'
import { idAt } from './random.ts'
import type { DemoEntry, DemoPerson } from './rows.ts'

interface Written {
  readonly draft: Draft
  readonly id: string
  readonly recordedAt: Date
}

/** Everything charted in one stay, numbered in the order of recording. Throws when a kind refuses an answer. */
export function entriesOf(bedside: Bedside, stayId: string): readonly DemoEntry[] {
  const written = new Map<Draft, Written>()
  for (const draft of draftsOf(bedside)) written.set(draft, write(draft, bedside))
  for (const draft of answersTo(numbered(), bedside)) written.set(draft, write(draft, bedside))
  return numbered()

  function numbered() {
    return [...written.values()]
      .toSorted((a, b) => a.recordedAt.getTime() - b.recordedAt.getTime() || (a.id < b.id ? -1 : 1))
      .map((one, index) => entryOf(one, index + 1))
  }

  function entryOf({ draft, id, recordedAt }: Written, number: number): DemoEntry {
    const author = authorOf(draft, bedside)
    const witness = draft.witness && leadOf(draft.witness, draft, bedside)
    return {
      id,
      stayId,
      number,
      kind: draft.kind.slug,
      version: versionOf(draft.kind),
      performedAt: draft.at,
      recordedAt,
      recordedById: author.id,
      recordedByName: author.name,
      recordedRole: author.role,
      witnessId: witness?.id ?? null,
      witnessName: witness?.name ?? null,
      supersedesId: (draft.supersedes && written.get(draft.supersedes)?.id) ?? null,
      reason: draft.reason ?? null,
      status: draft.status ?? 'final',
      raw: draft.kind.schema.parse(dataOf(draft, act => written.get(act)?.id)),
    }
  }
}

function dataOf({ data, names }: Draft, idOf: (act: Draft) => string | undefined): unknown {
  return names ? { ...(data as object), [names.field]: idOf(names.act) } : data
}

function draftsOf(bedside: Bedside): readonly Draft[] {
  const { story } = bedside
  const usual = [
    ...tubeCare(bedside),
    ...innerCannulaCare(bedside),
    ...cuffCare(bedside),
    ...suctionCare(bedside),
    ...stomaCare(bedside),
    ...(story.extra ?? []).flatMap(happens => happens(bedside)),
  ]
  return [
    ...usual,
    ...signCare(bedside, usual),
    ...tieCare(bedside, usual),
    ...humidificationCare(bedside),
    ...kitCare(bedside),
    ...aboveCuffCare(bedside),
    ...waterCuffCare(bedside),
    ...oralCare(bedside),
    ...observationCare(bedside),
    ...removalCare(bedside),
  ]
}

const USUAL_DELAY = [1, 9] as const // minutes from the act to its being written
const LATE_DELAY = [65, 170] as const
const LATE_SHARE = 0.02

/** Written some minutes after the act, now and then at the end of a busy hour, and never after the moment of seeding. */
function write(draft: Draft, { random, now }: Bedside): Written {
  const usual = random.chance(LATE_SHARE) ? random.between(...LATE_DELAY) : random.between(...USUAL_DELAY)
  const after = later(draft.at, minutes(draft.writtenAfter ?? usual))
  const recordedAt = new Date(Math.min(Math.floor(after.getTime()), now.getTime()))
  return { draft, recordedAt, id: idAt(draft.supersedes ? recordedAt : draft.at, random) }
}

function authorOf(draft: Draft, bedside: Bedside): DemoPerson {
  const { ward, bed } = placeAt(bedside, draft.at)
  return draft.by ? leadOf(draft.by, draft, bedside) : bedside.rota.nurse(ward, bed, draft.at)
}

function leadOf(role: Role, draft: Draft, bedside: Bedside): DemoPerson {
  return bedside.rota.lead(placeAt(bedside, draft.at).ward, role)
}
