import { personalValues } from '#app/care/care-plan/personal-values.ts'
import { reviewNotice } from '#app/care/care-plan/settings.ts'
import { careSettings } from '#app/care/kinds.ts'
import { policyInForce, valueUnder } from '#app/care/policy.ts'
import { env } from '#app/env.server.ts'
import { showValue } from '#app/rules/why.ts'
import { showDateTime, showDay } from '#app/time/display.ts'
import { daysBetween, localDay } from '#app/time/zone.ts'
import { policies } from '#database/policies.server.ts'
import { wardRecords } from '#database/records.server.ts'
import { recordOf } from './care-of.server.ts'

/** One own value of one patient of a ward. */
export interface PlanLine {
  readonly key: string
  readonly patientId: string
  readonly bed: string
  readonly family: string
  readonly given: string
  readonly setting: string
  readonly value: string
  readonly reason: string
  readonly by: string
  readonly reviewOn: string
  /** Days until its review; negative once that day has passed. */
  readonly daysLeft: number
  /** Whether its review is near enough to be planned, by the ward's policy. */
  readonly isSoon: boolean
}

/** The own values of a ward's present patients, those to be looked at soonest first. */
export async function wardCarePlans(wardId: string, now: Date): Promise<readonly PlanLine[]> {
  const { stays } = await wardRecords(wardId)
  const zone = env.hospitalTimeZone
  const today = localDay(now, zone)
  const notice = valueUnder(policyInForce(await policies(), wardId, now), reviewNotice)
  return stays
    .flatMap(stay =>
      personalValues(recordOf(stay)).map(({ setting, value, reason, reviewOn, by, since }) => {
        const daysLeft = daysBetween(today, reviewOn)
        const known = careSettings.find(({ name }) => name === setting)
        return {
          key: `${stay.stay.id} ${setting}`,
          patientId: stay.patient.id,
          bed: stay.stay.bedLabel,
          family: stay.patient.familyName,
          given: stay.patient.givenName,
          setting: known?.label ?? setting,
          value: known ? showValue(value, known.unit) : String(value),
          reason,
          by: `${by}, ${showDateTime(since, zone)}`,
          reviewOn: showDay(reviewOn),
          daysLeft,
          isSoon: daysLeft <= notice,
        }
      }),
    )
    .toSorted((a, b) => a.daysLeft - b.daysLeft || a.bed.localeCompare(b.bed, 'en', { numeric: true }))
}
