import type { PatientFacts } from './kind.ts'
import { LOCAL_PLAN } from './warning.ts'

/** Whom to call: `Airway team`, `2222`. */
export interface EmergencyNumber {
  readonly who: string
  readonly number: string
}

/**
 * What to do when breathing fails or a catheter will not pass (domain 5.2). Only a closed upper airway takes the face out of it:
 * where it is not known, oxygen goes to face and stoma.
 */
export function breathingAction({ upperAirway }: Pick<PatientFacts, 'upperAirway'>): string {
  const first =
    upperAirway === 'not open'
      ? 'Give oxygen to the stoma. The mouth does not connect to the lungs.'
      : 'Give oxygen to the face and the stoma. Take off any valve or cap, remove the inner cannula, then try a suction catheter.'
  return `Call for help now. ${first} ${LOCAL_PLAN}`
}

/** What to do at a fresh or heavy bleed (domain 5.2). */
export const BLEED_ACTION = `Call for help now and stay with the patient. Leave the tube in; if it has a cuff, keep it up. Treat this as a warning bleed. ${LOCAL_PLAN}`

export const BREATHING_SOURCE = 'National Tracheostomy Safety Project, emergency algorithms; RCEM learning'
