import { hours } from '../../time/duration.ts'
import { type Clock, intervalClock } from '../clock.ts'
import type { CareContext, TaskRule } from '../kind.ts'
import type { Setting } from '../policy.ts'
import { tubeCareFrom } from '../tube-care.ts'
import { withoutTube } from '../tube-change/tasks.ts'
import { tubeInPlace } from '../tube-change/tube.ts'
import { isBrushing, isRound, type OralCareData, oralCares } from './schema.ts'
import { brushingInterval, oralCareInterval } from './settings.ts'

const round: TaskRule = {
  name: 'oral-care',
  airway: false,
  settings: [oralCareInterval],
  says: ({ values }) =>
    `Every ${values.of(oralCareInterval)} h the mouth is looked at and moistened. Suction of the mouth alone does not count.`,
  clock: context => careClock(context, isRound, oralCareInterval),
}

const brushing: TaskRule = {
  name: 'tooth-brushing',
  airway: false,
  settings: [brushingInterval],
  opensWith: { care: 'brushed' },
  says: ({ values }) => `Teeth or dentures are brushed every ${values.of(brushingInterval)} h.`,
  clock: context => careClock(context, isBrushing, brushingInterval),
}

function careClock(context: CareContext, counts: (data: OralCareData) => boolean, interval: Setting<number>): Clock {
  if (!tubeInPlace(context.record)) return withoutTube(context)
  return intervalClock({
    values: context.values,
    last: context.record.latest(oralCares, counts),
    start: tubeCareFrom(context),
    interval: hours(context.values.of(interval)),
  })
}

export const oralCareTasks: readonly TaskRule[] = [round, brushing]
