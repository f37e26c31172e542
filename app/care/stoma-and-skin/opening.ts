import { BLEED_ACTION } from '../emergency.ts'
import type { CareContext } from '../kind.ts'
import { bleedWindowFrom, bleedWindowTo } from '../suction/bleeding-settings.ts'
import { stomaAgeDays, tubeInPlace } from '../tube-change/tube.ts'
import { LOCAL_PLAN, type Warning } from '../warning.ts'
import { openingFindings, type StomaData } from './schema.ts'
import { infectionSigns } from './settings.ts'
import { isLaryngectomy } from './tasks.ts'

/** What the opening itself asks people to notice, most pressing first. */
export function openingWarnings(data: StomaData, context: CareContext): readonly Warning[] {
  return [
    ...bleeding(data, context),
    ...neckSwelling(data, context),
    ...infection(data, context),
    ...breakdown(data),
    ...airLeak(data, context),
  ]
}

function bleeding(data: StomaData, context: CareContext): readonly Warning[] {
  if (data.bleeding === 'none') return []
  const cause = bleedingCause(data, context)
  const source = 'Bontempo and Manning: every bleed counts as a warning bleed'
  if (data.bleeding === 'spotting') {
    const action = 'Ask a doctor to look at the bleeding this shift, and look again within the hour.'
    return [{ name: 'stoma-spotting', level: 'amber', action, cause, source }]
  }
  const action = tubeInPlace(context.record)
    ? BLEED_ACTION
    : `Call for help now and stay with the patient. Treat this as a warning bleed. ${LOCAL_PLAN}`
  return [{ name: 'stoma-bleeding', level: 'red', action, cause, source }]
}

/** The days after the opening was made in which a bleed may come from an artery, said with the finding. */
function bleedingCause(data: StomaData, context: CareContext): string {
  const seen = data.bleeding === 'active' ? 'Active bleeding' : 'Blood'
  const age = stomaAgeDays(context)
  if (age === undefined) return `${seen} at the opening.`
  const from = context.values.of(bleedWindowFrom)
  const to = context.values.of(bleedWindowTo)
  if (age < from || age > to) return `${seen} at the opening on day ${age}.`
  return `${seen} at the opening on day ${age}: from day ${from} to day ${to} it may come from a large artery.`
}

// Where oxygen goes follows the airway: it does nothing at the face after a laryngectomy; when unsure, give it to both.
const oxygen = { open: 'Oxygen to face.', 'not open': 'Oxygen to the stoma.', 'not known': 'Oxygen to face and stoma.' }

function neckSwelling({ appearance }: StomaData, { record }: CareContext): readonly Warning[] {
  const seen = (['surgical emphysema', 'neck swelling'] as const).filter(finding => appearance.includes(finding))
  return seen.length === 0 ? [] : [swellingWarning(seen.map(finding => openingFindings[finding]).join('; '), record)]
}

/** Air under the skin or a new swelling of the neck, as it was seen: nothing more is blown through the tube. */
export function swellingWarning(seenWords: string, { patient }: CareContext['record']): Warning {
  return {
    name: 'neck-swelling',
    level: 'red',
    action: `Stop any bagging through the tube. ${oxygen[patient.upperAirway]} Call for help now. ${LOCAL_PLAN}`,
    cause: `${seenWords}: the tube may lie outside the windpipe.`,
    source: 'Emergency teaching texts (RCEM learning, NSW ACI)',
  }
}

function infection(data: StomaData, { values }: CareContext): readonly Warning[] {
  const signs = signsOfInfection(data)
  if (signs.length < values.of(infectionSigns)) return []
  return [
    {
      name: 'stoma-infection',
      level: 'amber',
      action: `Ask a doctor to look at the stoma this shift.${data.swab === 'yes' ? '' : ' Send a swab if local policy asks for one.'}`,
      cause: `Infection suspected: ${signs.join(', ')}.`,
      source: infectionSigns.source.says,
    },
  ]
}

function signsOfInfection({ appearance, fever }: StomaData): readonly string[] {
  const signs = (['redness', 'warmth', 'pus', 'odour'] as const).filter(sign => appearance.includes(sign))
  return [...signs.map(sign => openingFindings[sign].toLowerCase()), ...(fever === 'yes' ? ['fever'] : [])]
}

function breakdown({ appearance }: StomaData): readonly Warning[] {
  if (!appearance.includes('breakdown')) return []
  return [
    {
      name: 'stoma-breakdown',
      level: 'amber',
      action: 'Keep the tube from pulling, and ask ENT or the tracheostomy team to look at the wound today.',
      cause: 'The wound around the opening breaks down.',
      source: 'Product proposal',
    },
  ]
}

function airLeak({ appearance }: StomaData, context: CareContext): readonly Warning[] {
  if (!appearance.includes('air leak')) return []
  const tube = tubeInPlace(context.record)
  if (!tube && !isLaryngectomy(context)) return []
  return [
    {
      name: 'stoma-air-leak',
      level: 'amber',
      action: tube
        ? 'Check the position of the tube and the cuff, then tell the tracheostomy team today.'
        : 'Tell the tracheostomy team today.',
      cause: 'The opening has widened, or air leaks around the tube.',
      source: 'Red flag in teaching texts (NHS Wales, RCEM learning)',
    },
  ]
}
