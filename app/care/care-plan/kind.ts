import { showDay } from '../../time/display.ts'
import { addDays, localDay } from '../../time/zone.ts'
import type { FormProblem, KnownNames } from '../form-problem.ts'
import { type CareContext, careKind, wordsOf } from '../kind.ts'
import type { AnySetting, PersonalValue, SettingValue } from '../policy.ts'
import { sentence } from '../sentence.ts'
import type { Warning } from '../warning.ts'
import { personalValues } from './personal-values.ts'
import { type CarePlanData, carePlans } from './schema.ts'
import { reviewNotice } from './settings.ts'

/** A patient's own number in place of the ward's, with its reason and review date; or the way back. */
export const carePlan = careKind({
  ...carePlans,
  title: 'Care plan',
  chartWords: 'Change care plan',
  lane: 'Tube',
  chapter: 'Events and plans',
  act: 'set care plans',
  examples: [
    {
      setting: 'cuff-pressure-interval',
      step: 'set own value',
      value: 4,
      reviewOn: '2026-12-08',
      reason: 'Cuff loses pressure after turning',
    },
    { setting: 'cuff-pressure-interval', step: 'back to ward policy', reason: 'Steady for three days.' },
  ],
  summary: carePlanSentence,
  problems: planProblems,
  settings: [reviewNotice],
  standing: reviewsDue,
})

function carePlanSentence({ setting, step, value, reviewOn, reason }: CarePlanData): string {
  const plan =
    step === 'set own value' && value !== undefined && reviewOn !== undefined
      ? `own value ${value}, review by ${showDay(reviewOn)}`
      : 'back to ward policy'
  return `${wordsOf(setting)}: ${plan}. ${sentence(reason)}`
}

function planProblems(data: CarePlanData, context: CareContext, known: KnownNames): readonly FormProblem[] {
  const setting = known.settings.find(({ name, personal }) => personal && name === data.setting)
  if (!setting) return [{ field: 'setting', message: 'Choose a setting that may be set for one patient' }]
  if (data.step === 'set own value') {
    return [
      ...rangeProblem(context.values.judged(setting), data),
      ...bandProblem({ setting, value: data.value, field: 'value' }, context, known),
      ...reviewProblem(data, context),
    ]
  }
  if (!personalValues(context.record).some(value => value.setting === setting.name)) {
    return [{ field: 'step', message: `This patient has no own value for ${wordsOf(setting.name).toLowerCase()}` }]
  }
  const ward = context.values.judged(setting)
  const value = context.values.policy.values[ward.name] ?? ward.default
  return bandProblem({ setting, value, field: 'step' }, context, known)
}

/** The lower end of a band may not pass the upper one, whichever of them is set: every value would then be outside. */
function bandProblem(
  plan: { readonly setting: AnySetting; readonly value: SettingValue | undefined; readonly field: string },
  context: CareContext,
  known: KnownNames,
): readonly FormProblem[] {
  const { setting, value, field } = plan
  if (typeof value !== 'number') return []
  const end = known.settings.find(({ name }) => name === setting.notAbove || name === setting.notBelow)
  const limit = end && context.values.shown(end)
  if (typeof limit !== 'number' || !end) return []
  const isAbove = end.name === setting.notAbove && value > limit
  const isBelow = end.name === setting.notBelow && value < limit
  if (!isAbove && !isBelow) return []
  const words = `${isAbove ? 'at most' : 'at least'} ${limit} ${setting.unit}, the ${end.label.toLowerCase()} of this patient`
  return [{ field, message: `${setting.label}: ${words}` }]
}

function rangeProblem({ label, unit, min, max }: AnySetting, { value }: CarePlanData): readonly FormProblem[] {
  if (value === undefined || min === undefined || max === undefined || (value >= min && value <= max)) return []
  return [{ field: 'value', message: `${label}: from ${min} to ${max} ${unit}` }]
}

function reviewProblem({ reviewOn }: CarePlanData, { now, ward }: CareContext): readonly FormProblem[] {
  if (reviewOn === undefined || reviewOn >= localDay(now, ward.zone)) return []
  return [{ field: 'reviewOn', message: 'Review date must not be in the past' }]
}

/** An own value to be looked at soon says so ahead; one whose review day has passed stays in force, and warns until someone looks at it. */
function reviewsDue({ record, values, now, ward }: CareContext): readonly Warning[] {
  const today = localDay(now, ward.zone)
  const from = addDays(today, values.of(reviewNotice))
  return personalValues(record)
    .filter(({ reviewOn }) => reviewOn <= from)
    .map(value => reviewWarning(value, value.reviewOn < today))
}

function reviewWarning({ setting, value, by, reviewOn }: PersonalValue, isPast: boolean): Warning {
  const whose = `${wordsOf(setting)}: own value ${value}, set by ${by},`
  const source = 'Product proposal: an own value needs a review date'
  return isPast
    ? {
        name: `care-plan-review-${setting}`,
        level: 'amber',
        action: 'Review the care plan today: confirm the own value, or go back to ward policy.',
        cause: `${whose} was to be reviewed by ${showDay(reviewOn)}.`,
        source,
      }
    : {
        name: `care-plan-review-soon-${setting}`,
        level: 'blue',
        action: `Plan the review of the care plan by ${showDay(reviewOn)}.`,
        cause: `${whose} stays in force until someone confirms it or goes back to ward policy.`,
        source,
      }
}
