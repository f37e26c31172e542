import { hours } from '../../time/duration.ts'
import { intervalClock, shiftClock, suspended } from '../clock.ts'
import type { CareContext, Entry, TaskRule } from '../kind.ts'
import { tiesMostFingers } from '../stoma-and-skin/settings.ts'
import { tubeCareFrom } from '../tube-care.ts'
import { tubeChanges } from '../tube-change/schema.ts'
import { withoutTube } from '../tube-change/tasks.ts'
import { tubeInPlace } from '../tube-change/tube.ts'
import { lastTieLook, tieLooks } from './looks.ts'
import { tieChangeInterval } from './settings.ts'

const NO_TIES = 'no ties in use at the last look'

const check: TaskRule = {
  name: 'ties-check',
  airway: false,
  settings: [tiesMostFingers],
  says: ({ values }) =>
    `Once in each shift: ${values.of(tiesMostFingers) === 1 ? 'one finger fits' : 'one to two fingers fit'} under the ties, and the skin under them is looked at. A check of stoma and skin counts.`,
  clock(context) {
    const { record, ward } = context
    if (!tubeInPlace(record)) return withoutTube(context)
    if (isWithoutTies(context)) return suspended(NO_TIES)
    const last = tieLooks(record).find(({ fingers }) => fingers !== 'no ties')?.entry
    return shiftClock({ values: context.values, last, start: tubeCareFrom(context), ward })
  },
}

const change: TaskRule = {
  name: 'ties-change',
  airway: false,
  settings: [tieChangeInterval],
  opensWith: { changed: 'yes' },
  says: ({ values }) =>
    `Every ${values.of(tieChangeInterval)} hours, and whenever they are soiled or wet, with two people. A tube change counts, and so does a change charted with stoma and skin.`,
  clock(context) {
    if (!tubeInPlace(context.record)) return withoutTube(context)
    if (isWithoutTies(context)) return suspended(NO_TIES)
    const interval = hours(context.values.of(tieChangeInterval))
    return intervalClock({ values: context.values, last: lastChange(context), start: tubeCareFrom(context), interval })
  },
}

function isWithoutTies(context: CareContext): boolean {
  return lastTieLook(context)?.fingers === 'no ties'
}

/** The latest act that put on fresh ties. A tube that was in place on arrival is not an act. */
function lastChange({ record }: CareContext): Entry | undefined {
  const look = tieLooks(record).find(({ changed }) => changed)?.entry
  const tube = record.latest(tubeChanges, data => data.difficulty !== 'failed' && data.reason !== 'on arrival')
  if (!look || !tube) return look ?? tube
  return tube.performedAt > look.performedAt ? tube : look
}

export const tieTasks: readonly TaskRule[] = [check, change]
