import { hours } from '../../time/duration.ts'
import { intervalClock } from '../clock.ts'
import type { TaskRule } from '../kind.ts'
import { tubeCareFrom } from '../tube-care.ts'
import { withoutTube } from '../tube-change/tasks.ts'
import { tubeInPlace } from '../tube-change/tube.ts'
import { observationSets } from './schema.ts'
import { observationInterval } from './settings.ts'

const observations: TaskRule = {
  name: 'observations',
  airway: false,
  settings: [observationInterval],
  says: ({ values }) =>
    `Every ${values.of(observationInterval)} h, and whenever the patient looks different. The early-warning policy of the hospital may ask for more.`,
  clock(context) {
    const { record, values } = context
    if (!tubeInPlace(record)) return withoutTube(context)
    return intervalClock({
      last: record.latest(observationSets),
      start: tubeCareFrom(context),
      interval: hours(values.of(observationInterval)),
    })
  },
}

export const observationTasks: readonly TaskRule[] = [observations]
