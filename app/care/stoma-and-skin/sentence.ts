import { photographWords } from '../photographs.ts'
import { sentence } from '../sentence.ts'
import {
  dressingTypes,
  exudateAmounts,
  exudateTypes,
  openingFindings,
  type SkinSite,
  type StomaData,
  skinFindings,
  skinSites,
  stageTitles,
  suturesRemoved,
} from './schema.ts'

const lower = (words: string): string => words.charAt(0).toLowerCase() + words.slice(1)

/** The sentences of a stoma and skin check: opening, skin, dressing, sutures, ties. */
export function stomaSentence(data: StomaData): string {
  return [
    opening(data),
    skin(data),
    dressing(data),
    ...sutures(data),
    ties(data),
    ...(data.secondPerson
      ? [sentence(data.secondPerson === 'alone' ? 'Done alone' : `With ${data.secondPerson}`)]
      : []),
    ...(data.swab === 'yes' ? ['Swab sent.'] : []),
    ...(data.photographs
      ? [`${photographWords(data.photographs.length)}.`.replace(/^./, one => one.toUpperCase())]
      : []),
    ...(data.note ? [sentence(data.note)] : []),
  ].join(' ')
}

const bleedingWords: Readonly<Record<StomaData['bleeding'], string>> = {
  none: 'no bleeding',
  spotting: 'spotting of blood',
  'fresh ooze': 'fresh ooze of blood',
  active: 'active bleeding',
}

function opening({ appearance, exudate, exudateType, bleeding, pain, fever }: StomaData): string {
  const seen = appearance.map(finding => lower(openingFindings[finding])).join(', ')
  const wet =
    exudate === 'none' || exudateType === undefined
      ? 'no exudate'
      : `${lower(exudateAmounts[exudate])} ${lower(exudateTypes[exudateType])} exudate`
  return `Stoma: ${[
    seen,
    wet,
    bleedingWords[bleeding],
    ...(pain === undefined ? [] : [`pain ${pain} of 10`]),
    ...(fever === 'yes' ? ['fever'] : []),
  ].join('; ')}.`
}

function skin(data: StomaData): string {
  const places = `${data.sites.length} ${data.sites.length === 1 ? 'place' : 'places'} looked at`
  return data.skin === 'intact' ? `Skin intact, ${places}.` : `${skinWords(data)}; ${places}.`
}

/** `Stage 2 pressure injury, under flange, left, 8 mm`: the worst finding, its place and its size. */
export function skinWords({ skin: finding, stage, findingSite, sizeMm }: StomaData): string {
  return [
    stage === undefined ? skinFindings[finding] : stageWords(stage),
    ...(findingSite === undefined ? [] : [siteWords(findingSite)]),
    ...(sizeMm === undefined ? [] : [`${sizeMm} mm`]),
  ].join(', ')
}

/** `Stage 2 pressure injury`, `Deep tissue injury`. */
export function stageWords(stage: NonNullable<StomaData['stage']>): string {
  return stage === 'deep-tissue' ? stageTitles[stage] : `${stageTitles[stage]} pressure injury`
}

/** `under flange, left`: a place of the skin, inside a sentence. */
export function siteWords(site: SkinSite): string {
  return lower(skinSites[site])
}

function dressing({ dressing: step, dressingType }: StomaData): string {
  if (step === 'changed') {
    const kind = dressingType === undefined || dressingType === 'other' ? '' : `: ${lower(dressingTypes[dressingType])}`
    return `Cleaned, dressing changed${kind}.`
  }
  return step === 'none' ? 'No dressing.' : 'Dressing left in place.'
}

function sutures(data: StomaData): readonly string[] {
  if (suturesRemoved(data)) return ['Flange sutures removed.']
  if (data.sutures === 'loose') return ['Flange sutures loose.']
  return data.sutures === 'in place' ? ['Flange sutures intact.'] : []
}

const tieWords: Readonly<Record<StomaData['ties'], string>> = {
  none: 'no finger fits under them',
  one: 'one finger fits',
  two: 'two fingers fit',
  'more than two': 'more than two fingers fit',
  'no ties': 'none in use',
}

function ties({ ties: fingers, holderChanged }: StomaData): string {
  return `Ties${holderChanged === 'yes' ? ' changed' : ''}: ${tieWords[fingers]}.`
}
