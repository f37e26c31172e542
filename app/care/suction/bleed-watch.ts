import { showDateTime } from '../../time/display.ts'
import { earlier, hours } from '../../time/duration.ts'
import { aboveCuffSuctions } from '../above-cuff-suction/schema.ts'
import { isStillBleeding } from '../adverse-event/bleed.ts'
import { adverseEvents } from '../adverse-event/schema.ts'
import { innerCannulaActs } from '../inner-cannula/schema.ts'
import type { AnyCharted, CareContext, DataOf, Entry, PatientRecord } from '../kind.ts'
import { stomaChecks } from '../stoma-and-skin/schema.ts'
import { tubeChanges } from '../tube-change/schema.ts'
import { tubeInPlace } from '../tube-change/tube.ts'
import type { Warning } from '../warning.ts'
import { bleedCause } from './bleeding.ts'
import { bleedWatchHours, bleedWindowTo } from './bleeding-settings.ts'
import { suctions } from './schema.ts'

/**
 * A fresh bleed of the last days that has stopped: a warning bleed may be the first of two. While a red warning of it stands, this
 * one is silent.
 */
export function bleedWatch(context: CareContext): readonly Warning[] {
  const from = earlier(context.now, hours(context.values.of(bleedWatchHours)))
  const bleeds = lastBleeds(context).filter(({ entry }) => entry.performedAt >= from)
  const last = bleeds.toSorted((a, b) => b.entry.performedAt.getTime() - a.entry.performedAt.getTime())[0]
  if (!last || bleeds.some(({ stands }) => stands)) return []
  const when = showDateTime(last.entry.performedAt, context.ward.zone)
  return [
    {
      name: 'warning-bleed',
      level: 'amber',
      action: 'Make sure that a doctor has seen this bleed, and keep watching for another.',
      cause: `${bleedCause('Fresh blood', { ...context, now: last.entry.performedAt })} Charted ${when}.`,
      source: bleedWindowTo.source.says,
    },
  ]
}

interface Bleed {
  readonly entry: Entry
  /** Whether no later act of its kind says that it has stopped: then its own warning stands. */
  readonly stands: boolean
}

/** The latest bleed that each kind of care tells of. That of a tube change is red at its moment only, others of a tube while it is in. */
function lastBleeds({ record }: CareContext): readonly Bleed[] {
  function lastOf<K extends AnyCharted>(
    kind: K,
    blood: (data: DataOf<K>) => string | undefined,
    mayStand: (entry: Entry) => boolean,
  ): readonly Bleed[] {
    const telling = record.of(kind).filter(({ data }) => blood(data) !== undefined)
    const entry = telling.find(({ data }) => isFresh(blood(data)))
    return entry ? [{ entry, stands: entry === telling[0] && mayStand(entry) }] : []
  }
  const tube = tubeInPlace(record)
  const onTube = ({ performedAt }: Entry) => tube !== undefined && performedAt >= tube.performedAt
  return [
    ...lastOf(suctions, ({ blood }) => blood, onTube),
    ...lastOf(aboveCuffSuctions, ({ blood }) => blood, onTube),
    ...lastOf(innerCannulaActs, ({ blood }) => blood, onTube),
    ...lastOf(
      stomaChecks,
      ({ bleeding }) => bleeding,
      () => true,
    ),
    ...lastOf(
      tubeChanges,
      ({ bleeding }) => bleeding,
      () => false,
    ),
    ...lastEvent(record),
  ]
}

/** A bleed charted as an event was fresh by its name; one that was settled at once is kept in sight from then on. */
function lastEvent(record: PatientRecord): readonly Bleed[] {
  const entry = record.latest(adverseEvents, ({ event, outcome }) => event === 'bleeding' && outcome !== 'died')
  return entry ? [{ entry, stands: isStillBleeding(entry, record) }] : []
}

/** Fresh, heavy or active, as each kind words it; streaks, spotting and old blood are not. */
function isFresh(blood: string | undefined): boolean {
  return blood !== undefined && ['fresh', 'heavy', 'fresh ooze', 'active'].includes(blood)
}
