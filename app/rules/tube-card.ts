import { cuffState } from '../care/cuff-pressure/cuff.ts'
import { pairWords } from '../care/inner-cannula/pair.ts'
import type { CareContext } from '../care/kind.ts'
import { catheterRule } from '../care/suction/catheter.ts'
import { blindReinsertionBefore, tractEstablishedAfter } from '../care/tube-change/settings.ts'
import {
  dwellLimit,
  insertedOn,
  type TubeData,
  tubeInPlace,
  tubeTract,
  tubeWords,
  workingIdMm,
} from '../care/tube-change/tube.ts'
import { lastTube, tubeAbsence } from '../care/tube-change/tube-absence.ts'
import { openPlan } from '../care/tube-change-plan/open-plan.ts'
import { largestCatheter } from '../clinical/suction-catheter.ts'
import { isNewStoma, tractState } from '../clinical/tract.ts'
import { showDateTime, showDay } from '../time/display.ts'
import { isTooYoung } from './due-tasks.ts'
import { type TubeView, tubeView } from './views.ts'

/** The tube in place as a card shows it: the plate to compare with, the facts in words, dwell, and what to beware of. */
export interface TubeCard extends TubeView {
  readonly plate: {
    readonly idMm: number
    readonly idWithoutInnerMm?: number
    readonly odMm: number
    readonly lengthMm: number
    readonly label: string
    readonly cuff: string
    readonly markCm?: number
  }
  readonly facts: readonly { readonly term: string; readonly value: string }[]
  readonly newStoma: boolean
}

export type TubeCardOrNone = TubeCard | { readonly none: string }

const cuffs: Readonly<Record<TubeData['cuff'], string>> = {
  none: 'uncuffed',
  air: 'air-filled cuff',
  water: 'water-filled cuff',
  foam: 'foam cuff',
}

/** The card of the tube in place, or words on why there is none. */
export function tubeCard(context: CareContext): TubeCardOrNone {
  const tube = tubeInPlace(context.record)
  if (!tube) {
    return { none: noTubeWords(context) }
  }
  const { data } = tube
  const tract = tubeTract(context)
  return {
    ...tubeView(tube, context),
    plate: {
      idMm: data.idWithInner ?? data.idWithoutInner,
      ...(data.idWithInner === undefined ? {} : { idWithoutInnerMm: data.idWithoutInner }),
      odMm: data.od,
      lengthMm: data.lengthMm,
      label: `${data.size} ${data.sizeSystem}`,
      cuff: cuffs[data.cuff],
      ...(data.flangeMarkCm === undefined ? {} : { markCm: data.flangeMarkCm }),
    },
    facts: [...buildFacts(data, context), ...timeFacts(context)],
    newStoma: tract !== undefined && isNewStoma({ ...tract, blindDays: context.values.of(blindReinsertionBefore) }),
  }
}

/** Why there is no tube; of one that came out, which it was, since it or one like it has to go back in. */
function noTubeWords({ record, ward }: CareContext): string {
  const absence = tubeAbsence(record)
  if (!absence) return 'No tube charted yet.'
  const since = showDateTime(absence.since, ward.zone)
  if (absence.why === 'removed for good') return `Tube removed for good ${since}.`
  const tube = lastTube(record)?.data
  return `Tube came out ${since} and is not charted as back.${tube ? ` It was ${tube.line} ${tubeWords(tube)}.` : ''}`
}

function buildFacts(data: TubeData, context: CareContext) {
  const state = cuffState(context.record)
  const catheter = largestCatheter(workingIdMm(data), catheterRule(context.values))
  const cuff = state === 'deflated' ? `${cuffs[data.cuff]}, let down` : cuffs[data.cuff]
  return [
    { term: 'Size', value: `${data.size} ${data.sizeSystem}` },
    { term: 'Line', value: data.line },
    { term: 'Cuff', value: capital(cuff) },
    {
      term: 'Construction',
      value: `${capital(data.construction)} cannula${data.fenestrated === 'yes' ? ', fenestrated' : ''}`,
    },
    ...(data.construction === 'dual' ? [{ term: 'Inner cannula', value: innerWords(data) }] : []),
    ...pairFact(context),
    { term: '15 mm connector', value: connectors[data.connector] },
    ...(data.flange === 'adjustable' ? [{ term: 'Flange', value: `Adjustable, at ${data.flangeMarkCm} cm` }] : []),
    { term: 'Suction catheter', value: catheter === undefined ? 'None in stock fits' : `${catheter} Fr at most` },
  ]
}

const connectors: Readonly<Record<TubeData['connector'], string>> = {
  outer: 'On the outer tube',
  inner: 'On the inner cannula: needed for the bag',
  none: 'None',
}

function innerWords(data: TubeData): string {
  if (data.innerCannula === 'none') return 'None in place'
  return `${capital(data.innerCannula ?? 'not known')}${data.idWithInner === undefined ? '' : `, ${data.idWithInner.toFixed(1)} mm ID`}`
}

function timeFacts(context: CareContext) {
  const tube = tubeInPlace(context.record)
  const tract = tubeTract(context)
  if (!tube) return []
  const { zone } = context.ward
  const limit = dwellLimit(tube, context)
  const state = tract && tractState({ ...tract, establishedAfterDays: context.values.of(tractEstablishedAfter) })
  return [
    {
      term: 'Inserted',
      value: tube.data.insertedOn ? showDay(insertedOn(tube, context)) : showDateTime(tube.performedAt, zone),
    },
    ...(tract ? [{ term: 'Stoma made', value: `${showDay(tract.madeOn)}${state ? `, ${state}` : ''}` }] : []),
    ...(isTooYoung(context) ? [] : [{ term: 'Change by', value: `${showDay(limit.changeBy)} (${limit.because})` }]),
    ...plannedFact(context),
  ]
}

function pairFact(context: CareContext) {
  const words = pairWords(context)
  return words === undefined ? [] : [{ term: 'Reusable pair', value: words }]
}

function plannedFact({ record }: CareContext) {
  const plan = openPlan(record)
  if (!plan) return []
  const { operator } = plan.entry.data
  return [{ term: 'Change planned', value: `${showDay(plan.plannedOn)}${operator ? `, by ${operator}` : ''}` }]
}

const capital = (words: string): string => words.charAt(0).toUpperCase() + words.slice(1)
