import { isNewStoma } from '../../clinical/tract.ts'
import { BLEED_ACTION, BREATHING_SOURCE, breathingAction } from '../emergency.ts'
import type { CareContext } from '../kind.ts'
import { bleedCause } from '../suction/bleeding.ts'
import { bleedWindowTo } from '../suction/bleeding-settings.ts'
import { blindReinsertionBefore } from '../tube-change/settings.ts'
import { stomaAgeDays, tubeInPlace, tubeTract } from '../tube-change/tube.ts'
import { LOCAL_PLAN, type Warning } from '../warning.ts'
import { type AdverseEventData, events, leavesTubeOut } from './schema.ts'

/** What has to be done now, in the words for this event and this airway (domain 5.2); nothing once it is over. */
export function urgentWarnings(data: AdverseEventData, context: CareContext): readonly Warning[] {
  if (data.outcome === 'died') return []
  if (leavesTubeOut(data)) return [tubeOut(context)]
  if (data.event === 'bleeding') return [bleed(context)]
  if (data.event === 'valve with cuff up' && !data.done.includes('valve off')) return [valveOn(context)]
  if (data.event === 'wrong cannula' && !data.done.includes('cannula changed')) return [wrongCannula]
  return data.outcome === 'not settled' && data.event !== 'pressure injury' ? [unsettled(data, context)] : []
}

function unsettled({ event, what }: AdverseEventData, { record }: CareContext): Warning {
  return {
    name: 'event-not-settled',
    level: 'red',
    action: breathingAction(record.patient),
    cause: `${event === 'other' && what !== undefined ? what : events[event]}, not settled yet.`,
    source: BREATHING_SOURCE,
  }
}

function tubeOut(context: CareContext): Warning {
  const oxygen =
    context.record.patient.upperAirway === 'not open'
      ? 'Oxygen to the stoma. The mouth does not connect to the lungs.'
      : 'Oxygen to face and stoma.'
  const blindly = isNewOpening(context) === false ? '' : ' Do not push the tube back blindly.'
  const age = stomaAgeDays(context)
  return {
    name: 'event-tube-out',
    level: 'red',
    action: `Call for help now. ${oxygen}${blindly} ${LOCAL_PLAN}`,
    cause: `The tube came out and is not back. ${
      age === undefined
        ? 'When the opening was made is not charted.'
        : `The opening was made ${age} ${age === 1 ? 'day' : 'days'} ago.`
    }`,
    source: 'Bontempo and Manning; critical care texts differ between 5 and 7 days',
  }
}

/** Undefined where nothing is known of the opening. A laryngectomy stoma is sewn to the skin: only its age counts. */
function isNewOpening(context: CareContext): boolean | undefined {
  const tract = tubeTract(context)
  const age = stomaAgeDays(context)
  if (!tract || age === undefined) return undefined
  const blindDays = context.values.of(blindReinsertionBefore)
  return tract.laryngectomy ? age < blindDays : isNewStoma({ ...tract, blindDays })
}

function bleed(context: CareContext): Warning {
  return {
    name: 'event-bleeding',
    level: 'red',
    action: BLEED_ACTION,
    cause: bleedCause('Bleeding', context),
    source: bleedWindowTo.source.says,
  }
}

function valveOn({ record }: CareContext): Warning {
  const isFoam = tubeInPlace(record)?.data.cuff === 'foam'
  return {
    name: 'event-valve-with-cuff-up',
    level: 'red',
    action: isFoam
      ? `Take the valve off now. This cuff cannot be fully emptied. Call the tracheostomy team. ${LOCAL_PLAN}`
      : `Take the valve off now. The patient may not be able to breathe out. Check the patient, then call for help. ${LOCAL_PLAN}`,
    cause: 'A valve or cap with the cuff up lets air in and none out.',
    source: 'National Tracheostomy Safety Project, speaking valve trials',
  }
}

const wrongCannula: Warning = {
  name: 'event-wrong-cannula',
  level: 'red',
  action: `This cannula is not made for this tube. Change it now for the matching one. ${LOCAL_PLAN}`,
  cause: 'A wrong inner cannula is in, and no matching one was fitted.',
  source: 'Royal Marsden Manual, ch. 12: only with the tube it is made for',
}
