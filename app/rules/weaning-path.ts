import { cuffState } from '../care/cuff-pressure/cuff.ts'
import { tubesBack } from '../care/decannulation/failed.ts'
import { decannulations } from '../care/decannulation/schema.ts'
import { failedRemovalWindow } from '../care/decannulation/settings.ts'
import type { CareContext } from '../care/kind.ts'
import { tubeInPlace } from '../care/tube-change/tube.ts'
import { tubeAbsence } from '../care/tube-change/tube-absence.ts'
import type { WeaningStep } from '../care/weaning-plan/criteria.ts'
import { plannedSteps } from '../care/weaning-plan/schema.ts'
import { showDateTime, showDuration } from '../time/display.ts'
import { hours, later, since } from '../time/duration.ts'
import { isTooYoung } from './due-tasks.ts'
import { type PathStep, stepsOf } from './weaning-steps.ts'

/** Why there is no path, or why it is not judged, in words: first what holds, then why. */
export interface NoPath {
  readonly title: string
  readonly says: string
}

/** Where somebody is on the way out of the tube. It informs and decides nothing. */
export interface WeaningPath {
  readonly steps: readonly PathStep[]
  /** The step that comes next, with its criteria elsewhere; null where there is none to come. */
  readonly next: WeaningStep | null
  readonly noPath: NoPath | null
  /** What has to be known beside the steps. */
  readonly notes: readonly string[]
}

/** The path of one patient: its steps, or why there is none. */
export function weaningPath(context: CareContext): WeaningPath {
  const noPath = whyNoPath(context)
  if (noPath) return { steps: removedSteps(context), next: null, noPath, notes: [] }
  const steps = stepsOf(context)
  const here = steps.find(({ state }) => state === 'here')
  const next = here && (here.name === 'ready' ? 'removal' : here.name)
  return { steps, next: next ?? null, noPath: null, notes: notesOf(context) }
}

function whyNoPath(context: CareContext): NoPath | null {
  const { record, ward, now, values } = context
  if (record.patient.upperAirway === 'not open') {
    return {
      title: 'No weaning after a laryngectomy',
      says: 'The mouth does not connect to the lungs: the neck is the only airway, for good. Valve, cap and removal are never for this patient.',
    }
  }
  const absence = tubeAbsence(record)
  if (absence?.why === 'removed for good') {
    const until = later(absence.since, hours(values.of(failedRemovalWindow)))
    const watch =
      now < until
        ? ` A tube back in by ${showDateTime(until, ward.zone)} would count as a failed removal.`
        : ' The time in which a removal counts as failed is over.'
    const ago = showDuration(since(absence.since, now))
    return {
      title: 'The tube was removed for good',
      says: `On ${showDateTime(absence.since, ward.zone)}, ${ago} ago.${watch}`,
    }
  }
  if (absence) {
    return {
      title: 'The tube came out and is not charted as back',
      says: `On ${showDateTime(absence.since, ward.zone)}, not as planned. The path waits: follow the airway emergency steps, and chart the tube once it is in.`,
    }
  }
  if (!tubeInPlace(record)) return { title: 'No tube is charted', says: 'The path begins with the tube in place.' }
  if (isTooYoung(context)) {
    return {
      title: 'No rules for this age on this ward',
      says: 'The rules for adults do not apply, and there is no rule set for children: nothing is judged here. What was charted is below.',
    }
  }
  return null
}

/** Of somebody whose tube was removed for good: that the end was reached, and by which act. */
function removedSteps({ record, ward: { zone } }: CareContext): readonly PathStep[] {
  if (tubeAbsence(record)?.why !== 'removed for good') return []
  const removal = record.latest(decannulations)
  if (!removal) return []
  const says = showDateTime(removal.performedAt, zone)
  return [{ name: 'removal', title: plannedSteps.removal, state: 'done', says, entryId: removal.id }]
}

function notesOf(context: CareContext): readonly string[] {
  const { record, values, ward } = context
  const state = cuffState(record)
  const [back] = tubesBack(record, values)
  return [
    ...(state === 'foam'
      ? ['This tube has a foam cuff, which cannot be fully emptied: valve, cap and removal need another tube first.']
      : []),
    ...(back
      ? [
          `A tube went back in on ${showDateTime(back.back.performedAt, ward.zone)}, ${showDuration(back.after)} after a removal${back.isFailure ? ', which counts as failed' : ''}. What was met before it is shown with its date: look at it anew.`,
        ]
      : []),
  ]
}
