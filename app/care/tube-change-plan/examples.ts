import type { TubePlanData } from './schema.ts'

/** A routine change with everything ready: the case that other examples vary. */
export const routinePlan: TubePlanData = {
  step: 'plan',
  plannedOn: '2026-12-04',
  indication: 'routine',
  newTube: 'same',
  contraindications: ['none'],
  operator: 'E. Solberg',
  helper: 'R. Osei',
  equipment: 'yes',
  spareSame: 'yes',
  spareSmaller: 'yes',
  fasted: 'arranged',
  capnography: 'yes',
  consent: 'given',
  ifItFails: 'Oxygen to face and stoma, airway team called, tube one size smaller over the guide',
}

export const tubePlanExamples: readonly TubePlanData[] = [
  routinePlan,
  {
    ...routinePlan,
    indication: 'other',
    otherIndication: 'Granulation at the tip',
    newTube: 'Marrow Long 7.5',
    tract: 'Opening made 30-Oct-2026, 32 days old, established; tube in for 19 days',
    contraindications: ['support'],
    spareSmaller: 'no',
    consent: 'interests',
    senior: 'Dr N. Abara',
    seniorReason: 'The tip bleeds at every suction',
    informed: 'yes',
    note: 'Scope booked for 10:00.',
  },
  { step: 'call off', calledOffBecause: 'Fever since last night' },
]
