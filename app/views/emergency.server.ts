import { EMERGENCY_SOURCE, type EmergencySteps, emergencySteps, type TubeFacts } from '#app/care/emergency-steps.ts'
import type { CareContext } from '#app/care/kind.ts'
import { blindReinsertionBefore } from '#app/care/tube-change/settings.ts'
import { tubeInPlace, tubeTract } from '#app/care/tube-change/tube.ts'
import { isNewStoma } from '#app/clinical/tract.ts'
import { showDateTime } from '#app/time/display.ts'
import type { PatientCare } from './patient-context.server.ts'

/** Nothing is known of the tube: no step is left out that a tube may need. */
const ANY_TUBE: TubeFacts = { newStoma: true, isCuffed: true, isDual: true, hasConnectorOnInner: true }

/** The emergency steps of one patient, and when they were made. They show without a policy too. */
export function emergencyOf(
  { record, context, ward }: PatientCare,
  now: Date,
): EmergencySteps & { readonly source: string; readonly madeAt: string } {
  const facts = context ? tubeFacts(context) : ANY_TUBE
  return {
    ...emergencySteps(record.patient.upperAirway, facts),
    source: EMERGENCY_SOURCE,
    madeAt: showDateTime(now, ward.zone),
  }
}

/** What of the tube in place changes a step; every caution where no tube is charted. */
export function tubeFacts(context: CareContext): TubeFacts {
  const tube = tubeInPlace(context.record)?.data
  const tract = tubeTract(context)
  if (!tube) return ANY_TUBE
  return {
    newStoma: tract === undefined || isNewStoma({ ...tract, blindDays: context.values.of(blindReinsertionBefore) }),
    isCuffed: tube.cuff !== 'none',
    isDual: tube.construction === 'dual',
    hasConnectorOnInner: tube.connector === 'inner',
  }
}
