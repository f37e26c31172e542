import { hours } from '../../time/duration.ts'
import { intervalClock, noClock, suspended } from '../clock.ts'
import { cuffState } from '../cuff-pressure/cuff.ts'
import type { TaskRule } from '../kind.ts'
import { careOfTubeFrom } from '../tube-care.ts'
import { withoutTube } from '../tube-change/tasks.ts'
import { tubeInPlace } from '../tube-change/tube.ts'
import { hasPort, lastEmptying } from './acts.ts'
import { aboveCuffInterval, aboveCuffRateLimit } from './settings.ts'

const suctionAboveCuff: TaskRule = {
  name: 'above-cuff-suction',
  airway: false,
  settings: [aboveCuffInterval, aboveCuffRateLimit],
  says: ({ values }) =>
    `Every ${values.of(aboveCuffInterval)} h, and before the cuff is let down, through the port of a tube that has one. Up to ${values.of(aboveCuffRateLimit)} mL an hour speaks for letting the cuff down.`,
  clock(context) {
    const { record, values } = context
    const tube = tubeInPlace(record)
    if (!tube) return withoutTube(context)
    if (!hasPort(context)) return noClock
    if (cuffState(record) === 'deflated') return suspended('cuff is down')
    return intervalClock({
      values,
      last: lastEmptying(record),
      start: careOfTubeFrom(tube, context),
      interval: hours(values.of(aboveCuffInterval)),
    })
  },
}

export const aboveCuffTasks = [suctionAboveCuff]
