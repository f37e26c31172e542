import { showDateTime } from '../../time/display.ts'
import { hours, later } from '../../time/duration.ts'
import { afterRemovals } from '../after-removal/schema.ts'
import { cuffState } from '../cuff-pressure/cuff.ts'
import { BREATHING_SOURCE, breathingAction } from '../emergency.ts'
import type { CareContext } from '../kind.ts'
import { standsSince } from '../standing.ts'
import { stomaChecks } from '../stoma-and-skin/schema.ts'
import { tubeOutSince } from '../tube-change/tube-absence.ts'
import { LOCAL_PLAN, type Warning } from '../warning.ts'
import { unmetCriteria } from '../weaning-plan/criteria.ts'
import { standingTubeBack } from './failed.ts'
import { type DecannulationData, decannulations, removalKit } from './schema.ts'
import { afterRemovalWatch } from './settings.ts'

/** What the removal of a tube for good asks people to notice. */
export function removalWarnings(data: DecannulationData, context: CareContext): readonly Warning[] {
  return [
    ...covered(data, context),
    ...breathing(data, context),
    ...notAgreed(data),
    ...kitIncomplete(data),
    ...againstCriteria(context),
  ]
}

/** After a laryngectomy an airtight dressing closes the only airway; otherwise the opening is to be closed by one. */
function covered({ dressing }: DecannulationData, { record }: CareContext): readonly Warning[] {
  const { upperAirway } = record.patient
  if (dressing === 'no') {
    if (upperAirway !== 'open') return []
    const action = 'Put an airtight dressing on the opening.'
    const source = 'Decannulation teaching page: airtight dressing, pressed on to speak and to cough'
    return [{ name: 'opening-not-covered', level: 'amber', action, cause: 'Air leaks past the opening.', source }]
  }
  if (upperAirway === 'open') return []
  const isClosed = upperAirway === 'not open'
  return [
    {
      name: 'opening-covered',
      level: isClosed ? 'red' : 'amber',
      action: isClosed
        ? `Take the dressing off the opening now. The mouth does not connect to the lungs. Call for help. ${LOCAL_PLAN}`
        : 'Check now that air moves through mouth and nose. If it does not, take the dressing off.',
      cause: isClosed
        ? 'An airtight dressing closes the only airway.'
        : 'Whether the upper airway is open is not known.',
      source: 'RCEM learning, laryngectomy: oxygen and air only by the opening',
    },
  ]
}

function breathing({ breathing }: DecannulationData, { record }: CareContext): readonly Warning[] {
  if (breathing === 'comfortable') return []
  const { patient } = record
  return [
    {
      name: 'removal-breathing',
      level: 'red',
      action:
        patient.upperAirway === 'not open'
          ? breathingAction(patient)
          : `Call for help now. Give oxygen to the face and the opening. Bring the spare tube and dilators. ${LOCAL_PLAN}`,
      cause: `Breathing ${breathing === 'stridor' ? 'with stridor' : 'laboured'} after the tube was taken out.`,
      source: BREATHING_SOURCE,
    },
  ]
}

function notAgreed({ agreed }: DecannulationData): readonly Warning[] {
  if (agreed === 'yes') return []
  return [
    {
      name: 'removal-not-agreed',
      level: 'amber',
      action: 'Tell the tracheostomy team now.',
      cause: 'The team had not agreed to take the tube out.',
      source: "Royal Marsden Manual and St George's NHS, decannulation: the team agrees",
    },
  ]
}

function kitIncomplete({ kitMissing = [] }: DecannulationData): readonly Warning[] {
  if (kitMissing.length === 0) return []
  return [
    {
      name: 'removal-kit-incomplete',
      level: 'amber',
      action: 'Get what is missing now. Stay with the patient until it arrives.',
      cause: `Missing at the bedside: ${kitMissing.map(item => removalKit[item].toLowerCase()).join(', ')}.`,
      source: "Royal Marsden Manual and St George's NHS, decannulation: equipment at the bedside",
    },
  ]
}

/** It has been done: what the record did not show as ready is said, so that people watch for it. */
function againstCriteria(context: CareContext): readonly Warning[] {
  if (context.record.patient.upperAirway === 'not open') return []
  const isUp = cuffState(context.record) === 'inflated'
  const criteria = [...(isUp ? ['the cuff was charted as up'] : []), ...unmetCriteria('removal', context)]
  if (criteria.length === 0) return []
  return [
    {
      name: 'removal-criteria-not-met',
      level: 'amber',
      action: 'Watch closely, and tell the tracheostomy team today.',
      cause: `Not shown by the record before the tube came out: ${criteria.join('; ')}.`,
      source: 'Royal Marsden Manual, Ceriana: readiness for removal',
    },
  ]
}

/** What is red until the opening is looked at again, and for the first days that a tube may have to go back in. */
export function standingRemovalWarnings(context: CareContext): readonly Warning[] {
  const { record, values, ward, now } = context
  const since = tubeOutSince(record)
  if (!since) return standingTubeBack(context)
  const looks = [...record.since(stomaChecks, since), ...record.since(afterRemovals, since)]
  const isLookedAt = looks.some(({ performedAt }) => performedAt > since)
  const rule = { isSettledBy: () => true, warns: removalWarnings }
  const red = isLookedAt ? [] : standsSince(record.of(decannulations), rule, context).filter(isRed)
  const until = later(since, hours(values.of(afterRemovalWatch)))
  return now > until ? red : [...red, watch(showDateTime(until, ward.zone))]
}

const isRed = ({ level }: Warning) => level === 'red'

function watch(until: string): Warning {
  return {
    name: 'after-removal',
    level: 'blue',
    action: `Watch breathing, cough and voice. Keep a spare tube, one a size smaller and dilators at the bedside until ${until}.`,
    cause: 'The tube was taken out for good; some patients need one again within days.',
    source: afterRemovalWatch.source.says,
  }
}
