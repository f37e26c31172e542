import type { z } from 'zod'
import { careFields, choice, note, text } from '../field.ts'
import { charted } from '../kind.ts'

const answers = { yes: 'Yes', no: 'No', 'not assessed': 'Not assessed' } as const

const criterion = (label: string, hint?: string) =>
  choice({ label, options: answers, ...(hint === undefined ? {} : { hint }) })
const further = (label: string) => choice({ label, options: answers, more: true }).optional()

/** Why it was not assessed: asked for as soon as that is the answer. */
const whyNot = (label: string, field: string, more = false) =>
  text({
    label: `Reason: ${label}`,
    when: { field, is: ['not assessed'] },
    neededThen: true,
    ...(more ? { more } : {}),
  }).optional()

/** The core set of the Royal Marsden Manual and St George's NHS, in its order. */
export const coreCriteria = {
  cause: 'Reason for the tube resolved',
  airway: 'Airway open above the stoma',
  commands: 'Follows commands',
  cuffDown: 'Cuff down for long periods',
  secretions: 'No copious secretions',
  cough: 'Effective cough',
  swallow: 'Effective swallow',
  heart: 'Heart and circulation stable',
  chest: 'No new shadows on the chest image',
  team: 'Team agrees',
} as const

/** What the set of Ceriana adds. */
export const furtherCriteria = {
  carbonDioxide: 'PaCO2 below 60 mmHg',
  stenosis: 'Narrowing of the windpipe below 30%',
  strength: 'Expiratory pressure above 40 cmH2O, or cough flow above 160 L/min',
  infection: 'No infection',
} as const

/** Readiness for removal of the tube: each criterion yes, no, or not assessed with its reason. It informs, it does not decide. */
export const readinessSchema = careFields({
  cause: criterion(coreCriteria.cause),
  whyNotCause: whyNot('cause not assessed', 'cause'),
  airway: criterion(coreCriteria.airway, 'Scope, or airflow with a finger on the tube'),
  whyNotAirway: whyNot('airway not assessed', 'airway'),
  commands: criterion(coreCriteria.commands),
  whyNotCommands: whyNot('commands not assessed', 'commands'),
  cuffDown: criterion(coreCriteria.cuffDown),
  whyNotCuffDown: whyNot('cuff down not assessed', 'cuffDown'),
  secretions: criterion(coreCriteria.secretions),
  whyNotSecretions: whyNot('secretions not assessed', 'secretions'),
  cough: criterion(coreCriteria.cough),
  whyNotCough: whyNot('cough not assessed', 'cough'),
  swallow: criterion(coreCriteria.swallow),
  whyNotSwallow: whyNot('swallow not assessed', 'swallow'),
  heart: criterion(coreCriteria.heart),
  whyNotHeart: whyNot('circulation not assessed', 'heart'),
  chest: criterion(coreCriteria.chest),
  whyNotChest: whyNot('chest not assessed', 'chest'),
  team: criterion(coreCriteria.team),
  whyNotTeam: whyNot('team not asked', 'team'),
  carbonDioxide: further(furtherCriteria.carbonDioxide),
  whyNotCarbonDioxide: whyNot('PaCO2 not assessed', 'carbonDioxide', true),
  stenosis: further(furtherCriteria.stenosis),
  whyNotStenosis: whyNot('narrowing not assessed', 'stenosis', true),
  strength: further(furtherCriteria.strength),
  whyNotStrength: whyNot('strength not assessed', 'strength', true),
  infection: further(furtherCriteria.infection),
  whyNotInfection: whyNot('infection not assessed', 'infection', true),
  note: note({ label: 'Note', more: true }).optional(),
})

/** Readiness checklists: ask a record with this, or `readinessOf` for what holds of each criterion. */
export const readinessChecks = charted({ slug: 'decannulation-readiness', schema: readinessSchema })

export type ReadinessData = z.output<typeof readinessSchema>
