import type { CareContext } from '../kind.ts'
import { standsSince } from '../standing.ts'
import { bleedWarnings } from '../suction/bleeding.ts'
import type { Warning } from '../warning.ts'
import { type SecretionGradeData, secretionGrades } from './schema.ts'

/** What a grading asks people to notice: blood, feed, and secretions that are newly green or thick. */
export function secretionGradeWarnings(data: SecretionGradeData, context: CareContext): readonly Warning[] {
  return [...bleeding(data, context), ...feed(data), ...oldBlood(data), ...changed(data, context)]
}

function bleeding({ flags }: SecretionGradeData, context: CareContext): readonly Warning[] {
  const blood = flags.includes('fresh') ? 'fresh' : flags.includes('streaks') ? 'streaks' : undefined
  return bleedWarnings('secretions-blood', blood, context)
}

function feed({ flags }: SecretionGradeData): readonly Warning[] {
  if (!flags.includes('feed')) return []
  return [
    {
      name: 'secretions-feed',
      level: 'amber',
      action: 'Ask a doctor and the speech-language therapist to see the patient this shift.',
      cause: 'Secretions look like feed: food may be reaching the airway.',
      source: 'Common practice: aspiration or a fistula',
    },
  ]
}

function oldBlood({ flags }: SecretionGradeData): readonly Warning[] {
  if (!flags.includes('old')) return []
  return [
    {
      name: 'secretions-old-blood',
      level: 'blue',
      action: 'Look again at the next suction, and tell the doctor on the round.',
      cause: 'Brown secretions: old blood.',
      source: 'Product proposal',
    },
  ]
}

function changed(data: SecretionGradeData, { record, now }: CareContext): readonly Warning[] {
  const before = record.latest(secretionGrades, (_, entry) => entry.performedAt < now)?.data
  const found = signs(data).filter(sign => !before || !signs(before).includes(sign))
  if (found.length === 0) return []
  return [
    {
      name: 'secretions-changed',
      level: 'amber',
      action: 'Ask a doctor to see the patient this shift. Review humidity.',
      cause: `Secretions are ${found.join(' and ')}${before ? ', which is new' : ''}.`,
      source: 'Airway Care Score, Critical Care 2008; common practice',
    },
  ]
}

function signs({ colour, viscosity }: SecretionGradeData): readonly string[] {
  return [
    ...(colour === 'green' ? ['green'] : []),
    ...(viscosity === 'thick' || viscosity === 'tenacious' ? ['thick'] : []),
  ]
}

/** All of it stands until the next grading. */
export function standingSecretionWarnings(context: CareContext): readonly Warning[] {
  const acts = context.record.of(secretionGrades)
  return standsSince(acts, { isSettledBy: () => true, warns: secretionGradeWarnings }, context)
}
