import { aboveCuffSuctions } from '#app/care/above-cuff-suction/schema.ts'
import { aboveCuffInterval } from '#app/care/above-cuff-suction/settings.ts'
import { type Bedside, pacedTimes, tubeAt } from './bedside.ts'
import { type Draft, draft } from './draft.ts'

/** Volumes from above the cuff, at the beds whose tube has a port for it. */
export function aboveCuffCare(bedside: Bedside): readonly Draft[] {
  const { story, random } = bedside
  const { aboveCuff: pastDue } = story.stands
  if (pastDue === undefined) return []
  return pacedTimes(bedside, { every: aboveCuffInterval.default, pastDue })
    .filter(at => tubeAt(bedside, at)?.tube.cuff === 'air')
    .map(at => {
      const volumeMl = random.whole(2, story.secretions === 'thin' ? 8 : 16) / 2
      const colour = random.pick(['clear', 'clear', 'tan'])
      return draft(aboveCuffSuctions, at, { volumeMl, port: 'open', colour, blood: 'none' })
    })
}
