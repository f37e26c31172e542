import type { CataloguedItem } from '../catalogued-item.ts'
import type { CareContext } from '../kind.ts'
import { isPrintedAlike } from '../printed.ts'
import type { TubeData } from '../tube-change/schema.ts'
import { tubeInPlace } from '../tube-change/tube.ts'
import { LOCAL_PLAN, type Warning } from '../warning.ts'
import { isLeftOut } from './acts.ts'
import type { InnerCannulaData } from './schema.ts'

const MADE_FOR = 'Royal Marsden Manual, ch. 12: only with the tube it is made for'

type Rule = (data: InnerCannulaData, context: CareContext) => readonly Warning[]

/** A warning about what was left in place, and which later act settles it one way or the other. */
export interface FitRule {
  readonly warns: Rule
  readonly isSettledBy: (data: InnerCannulaData) => boolean
}

const putsBack = ({ act }: InnerCannulaData) => act !== 'unable' && act !== 'other only'

/** A tube left without its inner cannula. */
export const absence: FitRule = {
  warns: (data, { record }) => (isLeftOut(data) ? [absentWarning(tubeInPlace(record)?.data.connector)] : []),
  isSettledBy: data => putsBack(data) || isLeftOut(data),
}

/** No inner cannula in place: red where the 15 mm connector is on it, or may be, since the bag then does not fit. */
export function absentWarning(connector: 'outer' | 'inner' | 'none' | undefined): Warning {
  const onInner = connector === 'inner' || connector === undefined
  return {
    name: 'inner-cannula-absent',
    level: onInner ? 'red' : 'amber',
    action: onInner
      ? `Fit the correct inner cannula now. Without it the bag may not connect. ${LOCAL_PLAN}`
      : 'Fit the correct inner cannula now.',
    cause: 'No inner cannula in a dual-cannula tube.',
    source: 'Common practice; a teaching site on tubes whose connector is on the inner cannula',
  }
}

const notChecked: Rule = data =>
  data.act === 'unable' && data.whyUnable !== undefined && !isLeftOut(data)
    ? [
        {
          name: 'inner-cannula-not-checked',
          level: 'amber',
          action: 'Ask a senior nurse to come now. Check that air moves freely through the tube.',
          cause:
            data.whyUnable === 'stuck'
              ? 'The inner cannula would not come out.'
              : 'The inner cannula could not be looked at.',
          source: 'Common practice: a cannula that cannot be taken out cannot be cleared',
        },
      ]
    : []

/** What is said of a cannula that is not made for the tube: before it goes in and when it is found in place. */
export const OTHER_TUBE_ACTION = `This cannula is not made for this tube. Change it now for the matching one. ${LOCAL_PLAN}`

/**
 * Whether an inner cannula is made for a tube: as the catalogue said when it was charted, as long as that was of this tube;
 * otherwise by line and size as printed.
 */
export function isMadeFor(
  tube: Pick<TubeData, 'item' | 'line' | 'size'>,
  cannula: Pick<InnerCannulaData, 'line' | 'size' | 'madeFor' | 'notMadeFor'>,
): boolean {
  if (tube.item !== undefined && tube.item === cannula.madeFor) return true
  if (tube.item !== undefined && tube.item === cannula.notMadeFor) return false
  return (['line', 'size'] as const).every(name => isPrintedAlike(cannula[name] ?? tube[name], tube[name]))
}

/** What the catalogue settles as an act is charted: whether the scanned cannula is made for the tube in place. */
export function fitByCatalogue(
  { item }: Pick<InnerCannulaData, 'item'>,
  { record }: Pick<CareContext, 'record'>,
  catalogued: Pick<CataloguedItem, 'fits'>,
): Pick<InnerCannulaData, 'madeFor' | 'notMadeFor'> {
  const tube = tubeInPlace(record)?.data.item
  if (item === undefined || tube === undefined) return {}
  return catalogued.fits.includes(tube) ? { madeFor: tube } : { notMadeFor: tube }
}

/** Recorded all the same: it was found so. */
const otherTube: Rule = (data, { record }) => {
  const tube = tubeInPlace(record)?.data
  if (!tube || isMadeFor(tube, data)) return []
  return [
    {
      name: 'inner-cannula-other-tube',
      level: 'red',
      action: OTHER_TUBE_ACTION,
      cause: `Charted as ${[data.line, data.size].filter(Boolean).join(' ')}; the tube is ${tube.line} ${tube.size}.`,
      source: MADE_FOR,
    },
  ]
}

/** A single-use cannula that went back in, by this act or before it was found; silent once it was thrown away. */
const reused: Rule = (data, { record }) => {
  const isSingleUse = tubeInPlace(record)?.data.innerCannula === 'disposable'
  const goesBack = data.act === 'cleaned' || data.act === 'swapped'
  const isFound = data.foundReused === 'yes' && data.act !== 'replaced'
  if (!isFound && !(isSingleUse && goesBack)) return []
  const charted = goesBack
    ? `Charted as ${data.act === 'cleaned' ? 'cleaned and put back' : 'swapped for the clean spare'}`
    : 'Found cleaned and used again'
  return [
    {
      name: 'inner-cannula-reused',
      level: 'amber',
      action: 'This is single use. Replace it with a new one.',
      cause: `${charted}; this tube takes a disposable inner cannula.`,
      source: 'Device labelling',
    },
  ]
}

const notLocked: Rule = data =>
  data.locked === 'no'
    ? [
        {
          name: 'inner-cannula-not-locked',
          level: 'amber',
          action: 'Lock the inner cannula now. If it will not lock, check that it is made for this tube.',
          cause: 'Not locked in place, it can come out with a cough.',
          source: MADE_FOR,
        },
      ]
    : []

/** No matching spare lies at the bedside. */
export const noSpare: Rule = data =>
  data.spare === 'no'
    ? [
        {
          name: 'inner-cannula-no-spare',
          level: 'amber',
          action: 'Get a matching spare inner cannula now. Stay nearby until it arrives.',
          cause: 'No matching spare at the bedside.',
          source: "St George's NHS, emergency equipment: stays with the patient at all times",
        },
      ]
    : []

const always = () => true
/** Everything about what is in place, most urgent first; each stands until an act that settles it. */
export const fitRules: readonly FitRule[] = [
  absence,
  { warns: otherTube, isSettledBy: data => data.line !== undefined || data.size !== undefined },
  { warns: notChecked, isSettledBy: always },
  { warns: reused, isSettledBy: putsBack },
  { warns: notLocked, isSettledBy: data => data.locked !== undefined },
]
