import { showDateTime } from '../../time/display.ts'
import { minutes, since } from '../../time/duration.ts'
import type { CareContext, PatientRecord } from '../kind.ts'
import { tubeInPlace } from '../tube-change/tube.ts'
import type { Warning } from '../warning.ts'
import { cannulaType } from './acts.ts'
import { type InnerCannulaData, innerCannulaActs, type otherPlaces } from './schema.ts'
import { cleaningWithin } from './settings.ts'

/** Where the other one of a reusable pair is, and since when it is known to be there. */
export interface PairState {
  readonly other: keyof typeof otherPlaces
  readonly at: Date
  /** Whether a further matching spare lay at the bedside at the last act. */
  readonly hasFurtherSpare: boolean
}

/**
 * The other one of the pair of the tube in place, from what was charted last of it. A tube goes in with its clean spare; undefined
 * where the cannula is thrown away after use, or none was ever fitted.
 */
export function pairState(record: PatientRecord): PairState | undefined {
  const tube = tubeInPlace(record)
  if (tube?.data.construction !== 'dual' || cannulaType(tube, record) !== 'reusable') return undefined
  const acts = record.since(innerCannulaActs, tube.performedAt)
  const hasFurtherSpare = acts[0]?.data.spare !== 'no'
  for (const { data, performedAt } of acts) {
    const other = placeAfter(data)
    if (other) return { other, at: performedAt, hasFurtherSpare }
  }
  return { other: 'ready', at: tube.performedAt, hasFurtherSpare }
}

/** What an act says of the other one; a swap that does not say it takes it out dirty, unless a spare lies there all the same. */
function placeAfter({ act, other, spare }: InnerCannulaData): PairState['other'] | undefined {
  if (other !== undefined) return other
  return act === 'swapped' ? (spare === 'yes' ? 'ready' : 'cleaning') : undefined
}

const otherWords: Readonly<Record<PairState['other'], string>> = {
  ready: 'the other clean and ready',
  cleaning: 'the other being cleaned',
  lost: 'the other lost or broken',
}

/** `One in place, the other being cleaned since 10-Mar-2026 11:20`; undefined without a pair. */
export function pairWords({ record, ward }: CareContext): string | undefined {
  const pair = pairState(record)
  return pair && `One in place, ${otherWords[pair.other]} since ${showDateTime(pair.at, ward.zone)}`
}

/** No clean spare of the pair: one that is being cleaned presses with time, one that is lost is not replaced by itself. */
export function standingPair(context: CareContext): readonly Warning[] {
  const pair = pairState(context.record)
  if (!pair || pair.other === 'ready') return []
  const when = showDateTime(pair.at, context.ward.zone)
  if (pair.other === 'lost') {
    return [
      {
        name: 'inner-cannula-pair-lost',
        level: 'amber',
        action:
          'Ask the tracheostomy team for a new set or another tube today. Keep a whole tube of this size at hand.',
        cause: `One of the pair is lost or broken, and has no replacement of its own. Charted ${when}.`,
        source: 'Device instructions: the pair belongs to its tube',
      },
    ]
  }
  const isLong = since(pair.at, context.now) > minutes(context.values.of(cleaningWithin))
  return [
    {
      name: 'inner-cannula-no-clean-spare',
      level: isLong || !pair.hasFurtherSpare ? 'amber' : 'blue',
      action: 'Clean the other one of the pair, lay it ready and chart it.',
      cause: `No clean spare of the pair: the other one has been in cleaning since ${when}.`,
      source: cleaningWithin.source.says,
    },
  ]
}
