import type { PatientFacts } from './kind.ts'
import { LOCAL_PLAN } from './warning.ts'

/** One step: what to do, in bold, and what follows from it. */
export interface EmergencyStep {
  readonly act: string
  readonly next: string
}

export interface EmergencySteps {
  /** The upper airway in words: what the steps rest on. */
  readonly airway: string
  /** Where oxygen goes. */
  readonly oxygen: string
  readonly steps: readonly EmergencyStep[]
  readonly cautions: readonly string[]
}

/** What of the tube changes a step. */
export interface TubeFacts {
  readonly newStoma: boolean
  readonly isCuffed: boolean
  readonly isDual: boolean
  /** The bag connects to the inner cannula, so it has to go back in before the bag is used. */
  readonly hasConnectorOnInner: boolean
}

export const EMERGENCY_SOURCE =
  'McGrath and others, Anaesthesia 2012 (from memory); RCEM learning; NSW Agency for Clinical Innovation: in own words'

/**
 * The order of what to do when breathing fails, by the upper airway (domain 6.2, 6.3). A reference for trained staff, not
 * decision logic. Where the airway is not known, oxygen goes to face and stoma until it is settled.
 */
export function emergencySteps(upperAirway: PatientFacts['upperAirway'], tube: TubeFacts): EmergencySteps {
  return upperAirway === 'not open' ? laryngectomySteps(tube) : tracheostomySteps(upperAirway, tube)
}

const call: EmergencyStep = {
  act: 'Call for help.',
  next: 'Call the airway team by your local number and have the bedside kit brought.',
}

const passCatheter: EmergencyStep = {
  act: 'Pass a suction catheter.',
  next: 'It passes: suction, then look, listen and feel again.',
}

function tracheostomySteps(upperAirway: PatientFacts['upperAirway'], tube: TubeFacts): EmergencySteps {
  const isKnown = upperAirway === 'open'
  return {
    airway: isKnown ? 'Upper airway open' : 'Upper airway not known',
    oxygen: isKnown ? 'Give oxygen to the face and the neck' : 'Give oxygen to the face and the neck until it is known',
    steps: [
      call,
      lookListenFeel('at the mouth and the tube'),
      { act: 'High-flow oxygen to the face and the tracheostomy.', next: 'Two sources of oxygen.' },
      takeOff(tube),
      passCatheter,
      deflate(tube),
      {
        act: 'Not better: remove the tube.',
        next: 'Oxygen to the face and the stoma. Not breathing: start resuscitation.',
      },
      {
        act: 'Breathe for the patient.',
        next: 'By mask at the mouth with the stoma covered, or by a small mask over the stoma. Tubes are put in by experts.',
      },
    ],
    cautions: cautionsOf(tube),
  }
}

function laryngectomySteps(tube: TubeFacts): EmergencySteps {
  return {
    airway: 'Laryngectomy: no airway through mouth or nose',
    oxygen: 'Give oxygen to the neck. The mouth does not connect to the lungs',
    steps: [
      call,
      lookListenFeel('at the stoma'),
      { act: 'High-flow oxygen to the stoma.', next: 'If unsure whether it is a laryngectomy, to the face as well.' },
      takeOff(tube),
      passCatheter,
      deflate(tube),
      {
        act: 'Not better: remove the tube, if there is one.',
        next: 'Leave a voice prosthesis where it is. Oxygen to the stoma. Not breathing: start resuscitation.',
      },
      {
        act: 'Breathe for the patient at the stoma.',
        next: 'By a small mask over the stoma. Tubes are put in by experts, at the stoma only.',
      },
    ],
    cautions: cautionsOf({ ...tube, newStoma: false }),
  }
}

function lookListenFeel(where: string): EmergencyStep {
  return {
    act: `Look, listen and feel ${where}.`,
    next: 'Use carbon dioxide monitoring if it is there. Not breathing or no pulse: start resuscitation.',
  }
}

function takeOff({ isDual, hasConnectorOnInner }: TubeFacts): EmergencyStep {
  const bag = hasConnectorOnInner
    ? ' This tube’s bag connects to the inner cannula: put a clean one in to use the bag.'
    : ''
  return {
    act: `Take off any valve, cap or humidifier.${isDual ? ' Remove the inner cannula.' : ''}`,
    next: `Then look, listen and feel again.${bag}`,
  }
}

function deflate({ isCuffed }: TubeFacts): EmergencyStep {
  return isCuffed
    ? {
        act: 'It will not pass: let the cuff down.',
        next: 'Look, listen and feel again. Better: stay, and go on with a full assessment.',
      }
    : { act: 'It will not pass: look, listen and feel again.', next: 'Better: stay, and go on with a full assessment.' }
}

function cautionsOf({ newStoma }: TubeFacts): readonly string[] {
  return [
    'Do not squeeze the bag hard through a tube that may be blocked or out of place.',
    ...(newStoma ? ['New stoma: do not re-insert blindly.'] : []),
    LOCAL_PLAN,
  ]
}
