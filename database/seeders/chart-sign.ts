import { bedHeadSigns, type SignData } from '#app/care/bed-head-sign/schema.ts'
import { tubeChanges } from '#app/care/tube-change/schema.ts'
import { later, minutes } from '#app/time/duration.ts'
import { type Bedside, tubeAt } from './bedside.ts'
import { type Draft, draft } from './draft.ts'

/** The bed at which the sign of the last tube still hangs: somebody forgot to print the new one. */
const FORGETFUL_BED = 'C7'

/** Bed-head signs: one printed for each tube soon after it went in, or without a tube on arrival, and taken down with the last. */
export function signCare(bedside: Bedside, charted: readonly Draft[]): readonly Draft[] {
  const { story, admittedAt, until } = bedside
  const tubes = charted.filter(({ kind }) => kind.slug === tubeChanges.slug)
  if (tubes.length === 0) {
    return story.patient.upperAirway === 'not open' ? [printed(bedside, later(admittedAt, minutes(35)))] : []
  }
  const signs = tubes
    .slice(0, story.bed === FORGETFUL_BED ? 1 : tubes.length)
    .map(tube => printed(bedside, later(tube.at, minutes(25)), tube))
  const isRemoved = story.removedHoursAgo !== undefined
  return isRemoved ? [...signs, takenDown(bedside, later(until, minutes(20)))] : signs
}

function printed(bedside: Bedside, at: Date, tube?: Draft): Draft {
  const sutures = tubeAt(bedside, at)?.sutures === 'in place' ? 'yes' : 'no'
  const data: SignData = { act: 'printed', ...shown(bedside), ...(tube ? { sutures } : {}) }
  return draft(bedHeadSigns, at, data, tube ? { names: { field: 'tube', act: tube } } : {})
}

function takenDown(bedside: Bedside, at: Date): Draft {
  return draft(bedHeadSigns, at, { act: 'taken down', ...shown(bedside) })
}

function shown({ story: { patient } }: Bedside) {
  const { upperAirway: form, laryngoscopy, airwayNotes } = patient
  return { form, ...(laryngoscopy ? { laryngoscopy } : {}), ...(airwayNotes ? { airwayNotes } : {}) }
}
