import type { z } from 'zod'
import { careFields, choice, date, note, text } from '../field.ts'
import { charted } from '../kind.ts'

export const plannedSteps = {
  cuff: 'Cuff deflation trial',
  valve: 'One-way valve trial',
  cap: 'Cap trial',
  removal: 'Removal of the tube for good',
  none: 'Nothing: take back the plan',
} as const
export type PlannedStep = keyof typeof plannedSteps

const aStepIsPlanned = { field: 'step', is: ['cuff', 'valve', 'cap', 'removal'] }

/** The next step of weaning as the team orders it. What is contraindicated is refused here, before it is done. */
export const weaningPlanSchema = careFields({
  step: choice({ label: 'Next step', options: plannedSteps }),
  plannedOn: date({ label: 'Planned day', when: aStepIsPlanned, neededThen: true }).optional(),
  cuffThen: choice({
    label: 'Cuff during it',
    options: { down: 'Fully down', none: 'No cuff', up: 'Up' },
    when: aStepIsPlanned,
    neededThen: true,
  }).optional(),
  agreedWith: text({
    label: 'Agreed with',
    hint: 'Names and roles',
    when: aStepIsPlanned,
    neededThen: true,
  }).optional(),
  seniorName: text({
    label: 'Senior who decides against a criterion',
    section: 'Only when a criterion is not met',
    hint: 'Name and role; leave empty otherwise',
    when: aStepIsPlanned,
  }).optional(),
  seniorReason: note({ label: 'Reason for that', maxLength: 500, when: aStepIsPlanned }).optional(),
  note: note({ label: 'Note', more: true }).optional(),
})

/** Steps of weaning that were planned: ask a record with this, or `plannedStep` for the one that stands. */
export const weaningPlans = charted({ slug: 'weaning-plan', schema: weaningPlanSchema })

export type WeaningPlanData = z.output<typeof weaningPlanSchema>
