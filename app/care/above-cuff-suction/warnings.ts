import type { CareContext } from '../kind.ts'
import { standsSince } from '../standing.ts'
import { bleedWarnings } from '../suction/bleeding.ts'
import { tubeInPlace } from '../tube-change/tube.ts'
import type { Warning } from '../warning.ts'
import { actsOnTube } from './acts.ts'
import type { AboveCuffData } from './schema.ts'

/** What suction above the cuff asks people to notice, most urgent first. Silent when no tube is in, but for blood. */
export function aboveCuffWarnings(data: AboveCuffData, context: CareContext): readonly Warning[] {
  return [
    ...blood(data, context),
    ...(tubeInPlace(context.record) ? [...noCuff(context), ...blocked(data)] : []),
    ...feed(data),
  ]
}

function blood(data: AboveCuffData, context: CareContext): readonly Warning[] {
  return bleedWarnings('above-cuff-blood', data.blood, context)
}

function blocked({ port }: AboveCuffData): readonly Warning[] {
  if (port !== 'blocked') return []
  return [
    {
      name: 'above-cuff-blocked',
      level: 'amber',
      action:
        'Clear the port as its instructions say, or ask the tracheostomy team. Keep the cuff up until it is open.',
      cause: 'Through a blocked port secretions gather above the cuff unseen.',
      source: 'Device instructions; common practice',
    },
  ]
}

function feed({ colour }: AboveCuffData): readonly Warning[] {
  if (colour !== 'feed') return []
  return [
    {
      name: 'above-cuff-feed',
      level: 'amber',
      action: 'Ask a doctor and the speech-language therapist to see the patient this shift.',
      cause: 'Secretions above the cuff look like feed: food may be reaching the airway.',
      source: 'Common practice: aspiration or a fistula',
    },
  ]
}

function noCuff({ record }: CareContext): readonly Warning[] {
  if (tubeInPlace(record)?.data.cuff !== 'none') return []
  return [
    {
      name: 'above-cuff-no-cuff',
      level: 'amber',
      action: 'Check which tube is in and correct the record.',
      cause: 'The record shows a tube without a cuff.',
      source: 'Product proposal',
    },
  ]
}

/** What stands until the next emptying shows otherwise: blood, and a port that is blocked. */
export function standingAboveCuffWarnings(context: CareContext): readonly Warning[] {
  const rule = {
    isSettledBy: () => true,
    warns: (data: AboveCuffData, then: CareContext) => [...blood(data, then), ...blocked(data)],
  }
  return standsSince(actsOnTube(context.record), rule, context)
}
