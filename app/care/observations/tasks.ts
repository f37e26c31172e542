import { hours, minutes, since } from '../../time/duration.ts'
import { type Clock, intervalClock, shiftClock, sooner } from '../clock.ts'
import type { CareContext, Entry, TaskRule } from '../kind.ts'
import { tubeCareFrom } from '../tube-care.ts'
import { withoutTube } from '../tube-change/tasks.ts'
import { tubeInPlace } from '../tube-change/tube.ts'
import { trialNames } from '../weaning-trial/schema.ts'
import { trialEarlyPeriod, trialObservationEarly, trialObservationInterval } from '../weaning-trial/settings.ts'
import { runningTrials, type Trial } from '../weaning-trial/trials.ts'
import { observationSets } from './schema.ts'
import { observationInterval } from './settings.ts'
import { observationTaskName } from './task-name.ts'

const observations: TaskRule = {
  name: observationTaskName,
  airway: false,
  settings: [observationInterval, trialObservationEarly, trialEarlyPeriod, trialObservationInterval],
  says: ({ values }) =>
    `Every ${values.of(observationInterval)} h, and whenever the patient looks different. In a weaning trial every ${values.of(trialObservationEarly)} minutes for the first ${values.of(trialEarlyPeriod)}, then every ${values.of(trialObservationInterval)}. The early-warning policy of the hospital may ask for more.`,
  clock(context) {
    const { record, values } = context
    if (!tubeInPlace(record)) return withoutTube(context)
    const last = record.latest(observationSets)
    const regular = intervalClock({
      values,
      last,
      start: tubeCareFrom(context),
      interval: hours(values.of(observationInterval)),
    })
    return runningTrials(record).reduce<Clock>(
      (clock, trial) => sooner(clock, trialClock(trial, last, context)),
      regular,
    )
  },
}

/** Often while a trial has just begun, less so later on. */
function trialClock({ name, startedAt }: Trial, last: Entry | undefined, { values }: CareContext): Clock {
  const from = last && last.performedAt > startedAt ? last.performedAt : startedAt
  const isEarly = since(startedAt, from) < minutes(values.of(trialEarlyPeriod))
  const interval = minutes(values.of(isEarly ? trialObservationEarly : trialObservationInterval))
  const because = `a ${trialNames[name].toLowerCase()} trial runs`
  return intervalClock({ values, last, start: startedAt, interval, because })
}

const flags: TaskRule = {
  name: 'red-flags',
  airway: true,
  settings: [],
  says: () => 'The list of red flags once in each shift, with a set of observations.',
  clock(context) {
    const { record, ward } = context
    if (!tubeInPlace(record)) return withoutTube(context)
    const last = record.latest(observationSets, ({ redFlags }) => redFlags !== undefined)
    return shiftClock({ values: context.values, last, start: tubeCareFrom(context), ward })
  },
}

export const observationTasks: readonly TaskRule[] = [observations, flags]
