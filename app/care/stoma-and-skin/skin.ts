import { needsReferral } from '../../clinical/pressure-injury.ts'
import { showDate } from '../../time/display.ts'
import type { CareContext, Entry, PatientRecord } from '../kind.ts'
import { tubeInPlace } from '../tube-change/tube.ts'
import type { Warning } from '../warning.ts'
import { type StomaData, sitesLeftOut, stomaChecks } from './schema.ts'
import { siteWords, skinWords } from './sentence.ts'

const STAGES = 'NPUAP (now NPIAP) 2016 stages; referral is a product proposal'

/** What the skin of this check asks people to notice. A pressure injury already known at that place is not new. */
export function skinWarnings(data: StomaData, context: CareContext): readonly Warning[] {
  return [...injury(data, context), ...moisture(data), ...partialLook(data, context)]
}

function injury(data: StomaData, { record }: CareContext): readonly Warning[] {
  if (data.stage === undefined) return []
  const cause = `${skinWords(data)}.`
  if (!needsReferral(data.stage)) {
    const action = 'Take the pressure off this place and look again next shift.'
    return [{ name: 'pressure-injury-early', level: 'blue', action, cause, source: STAGES }]
  }
  if (
    unresolvedSkin(record).some(
      ({ data: { stage, findingSite } }) => stage === data.stage && findingSite === data.findingSite,
    )
  ) {
    const action = 'Keep the pressure off and follow the wound plan.'
    return [{ name: 'pressure-injury-known', level: 'blue', action, cause: `Known: ${cause}`, source: STAGES }]
  }
  const action = 'Take the pressure off, refer to wound care or ENT today, and report an incident.'
  return [{ name: 'pressure-injury', level: 'amber', action, cause: `New: ${cause}`, source: STAGES }]
}

function moisture(data: StomaData): readonly Warning[] {
  if (data.skin !== 'moisture damage' && !data.appearance.includes('maceration')) return []
  return [
    {
      name: 'moisture-damage',
      level: 'amber',
      action: 'Change what is wet, protect the skin with a barrier, and tell the charge nurse this shift.',
      cause: data.skin === 'moisture damage' ? `${skinWords(data)}.` : 'The skin edge of the opening is macerated.',
      source: 'Moisture damage is not a pressure injury and has no stage (NPUAP 2016)',
    },
  ]
}

function partialLook(data: StomaData, { record }: CareContext): readonly Warning[] {
  const leftOut = tubeInPlace(record) ? sitesLeftOut(data) : []
  if (leftOut.length === 0) return []
  return [
    {
      name: 'skin-not-all-seen',
      level: 'blue',
      action: `Look at the rest of the skin this shift: ${leftOut.map(siteWords).join('; ')}.`,
      cause: 'The check stays due until every place has been seen.',
      source: "O'Toole 2017, skin bundle; all places each shift is a product proposal",
    },
  ]
}

/** Skin findings that no later check has cleared, latest first, one for each place. */
export function unresolvedSkin(record: PatientRecord): readonly Entry<StomaData>[] {
  const cleared = new Set<string>()
  const open: Entry<StomaData>[] = []
  for (const entry of record.of(stomaChecks)) {
    const { skin, findingSite, sites } = entry.data
    const worrying = skin !== 'intact' && skin !== 'blanching redness'
    if (worrying && findingSite && !cleared.has(findingSite)) open.push(entry)
    // The worst finding hides milder ones elsewhere: only a check that found no damage clears every place it looked at.
    for (const site of worrying && findingSite ? [findingSite] : sites) cleared.add(site)
  }
  return open
}

/** Injuries and moisture damage that stand until a later check clears their place: one warning each, naming every place. */
export function standingSkinWarnings({ record, ward }: CareContext): readonly Warning[] {
  const open = unresolvedSkin(record)
  const places = (entries: readonly Entry<StomaData>[]): string =>
    entries.map(({ data, performedAt }) => `${skinWords(data)}, seen ${showDate(performedAt, ward.zone)}.`).join(' ')
  const injuries = open.filter(({ data }) => data.stage !== undefined && needsReferral(data.stage))
  const wet = open.filter(({ data }) => data.skin === 'moisture damage')
  return [
    ...(injuries.length === 0 ? [] : [standing('pressure-injury', REFERRED, places(injuries), STAGES)]),
    ...(wet.length === 0
      ? []
      : [standing('moisture-damage', KEPT_DRY, places(wet), 'NPUAP 2016: moisture damage has no stage')]),
  ]
}

const REFERRED = 'Keep the pressure off, and make sure that wound care or ENT has been told.'
const KEPT_DRY = 'Keep the skin dry and protected.'

function standing(name: string, action: string, cause: string, source: string): Warning {
  return { name, level: 'amber', action, cause, source }
}
