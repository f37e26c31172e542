import { numberSetting } from '../policy.ts'

export const aboveCuffInterval = numberSetting({
  name: 'above-cuff-suction-interval',
  label: 'Suction above the cuff every',
  unit: 'h',
  default: 4,
  min: 1,
  max: 12,
  personal: true,
  affects: 'Above-cuff suction: when the next is due. An own value starts it before the first volume was charted.',
  source: {
    says: 'Hospital practice every 1 to 4 hours; an individual interval by volume in a published study',
    standing: 'common practice',
  },
})

export const aboveCuffRateLimit = numberSetting({
  name: 'above-cuff-rate-limit',
  label: 'Secretions above the cuff speak for letting it down up to',
  unit: 'mL/h',
  default: 1,
  min: 0.5,
  max: 5,
  affects: 'Above-cuff suction: the rate since the emptying before, as a sign of readiness for letting the cuff down.',
  source: {
    says: 'Pryor 2016: at most 1 mL an hour, together with medical and respiratory stability',
    standing: 'published',
  },
})

export const aboveCuffSettings = [aboveCuffInterval, aboveCuffRateLimit]
