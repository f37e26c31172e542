import type { ObservationData } from './schema.ts'

/** Observations of somebody who is well: the case that other examples vary. */
export const calm: ObservationData = {
  respiratoryRate: 16,
  spo2: 96,
  oxygen: 'stoma mask',
  fio2: 28,
  effort: 'easy',
  heartRate: 82,
  awareness: 'alert',
}

export const observationExamples: readonly ObservationData[] = [
  calm,
  {
    respiratoryRate: 18,
    spo2: 95,
    oxygen: 'air',
    effort: 'easy',
    heartRate: 76,
    awareness: 'alert',
    temperature: 36.8,
  },
  {
    respiratoryRate: 26,
    spo2: 92,
    oxygen: 'exchanger',
    flow: 2.5,
    effort: 'increased',
    heartRate: 118,
    awareness: 'confused',
    systolic: 104,
    note: 'Doctor called',
  },
  { respiratoryRate: 0, spo2: 78, oxygen: 'other', flow: 15, effort: 'none', heartRate: 40, awareness: 'unresponsive' },
  {
    respiratoryRate: 14,
    spo2: 97,
    oxygen: 'ventilator',
    fio2: 40,
    effort: 'easy',
    heartRate: 70,
    awareness: 'sedated',
  },
]
