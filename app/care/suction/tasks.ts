import { hours } from '../../time/duration.ts'
import { type Clock, intervalClock } from '../clock.ts'
import type { CareContext, TaskRule } from '../kind.ts'
import { withoutTube } from '../tube-change/tasks.ts'
import { type TubeEntry, tubeInPlace } from '../tube-change/tube.ts'
import { actsOnTube, meetsNeed } from './acts.ts'
import { copiousInterval, needInterval } from './settings.ts'

const need: TaskRule = {
  name: 'suction-need',
  airway: true,
  settings: [needInterval, copiousInterval],
  says: ({ values }) =>
    `Look and listen every ${values.of(needInterval)} h; every ${values.of(copiousInterval)} h after copious secretions. Suction only when it is needed.`,
  clock(context) {
    const tube = tubeInPlace(context.record)
    return tube ? needClock(tube, context) : withoutTube(context)
  },
}

function needClock(tube: TubeEntry, { record, values }: CareContext): Clock {
  const last = actsOnTube(record).find(({ data }) => meetsNeed(data))
  const usual = values.of(needInterval)
  const isCopious = last?.data.amount === 'copious' && values.of(copiousInterval) < usual
  return intervalClock({
    values,
    last,
    start: new Date(Math.max(tube.performedAt.getTime(), record.admittedAt.getTime())),
    interval: hours(isCopious ? values.of(copiousInterval) : usual),
    ...(isCopious ? { because: 'secretions were copious' } : {}),
  })
}

export const suctionTasks: readonly TaskRule[] = [need]
