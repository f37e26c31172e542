import { noClock, shiftClock } from '../clock.ts'
import type { TaskRule } from '../kind.ts'
import { careOfTubeFrom } from '../tube-care.ts'
import { withoutTube } from '../tube-change/tasks.ts'
import { tubeInPlace } from '../tube-change/tube.ts'
import { waterCuffs } from './schema.ts'
import { waterCuffDifference } from './settings.ts'

const filling: TaskRule = {
  name: 'water-cuff-check',
  airway: true,
  settings: [waterCuffDifference],
  says: () =>
    'Once in each shift while a tube with a water cuff is in: all water out, measured, and the prescribed volume of sterile water in.',
  clock(context) {
    const { record, ward } = context
    const tube = tubeInPlace(record)
    if (!tube) return withoutTube(context)
    if (tube.data.cuff !== 'water') return noClock
    const start = careOfTubeFrom(tube, context)
    return shiftClock({ values: context.values, last: record.latest(waterCuffs), start, ward })
  },
}

export const waterCuffTasks = [filling]
