import { type SkinSite, type StomaData, stomaChecks } from '#app/care/stoma-and-skin/schema.ts'
import { dressingInterval } from '#app/care/stoma-and-skin/settings.ts'
import { since } from '#app/time/duration.ts'
import { type Bedside, hoursBefore, pacedTimes, placeAt, tubeAt } from './bedside.ts'
import { type Draft, draft } from './draft.ts'
import { leftOut, momentIn, shiftsOf } from './shifts.ts'

/** Checks of stoma and skin: one in each shift, and those at which the dressing was changed. */
export function stomaCare(bedside: Bedside): readonly Draft[] {
  const { dressing } = bedside.story.stands
  const changes =
    dressing === undefined ? [] : pacedTimes(bedside, { every: dressingInterval.default, pastDue: dressing })
  const looks = shiftsOf(bedside)
    .slice(leftOut[bedside.story.stands.stoma])
    .filter(shift => !changes.some(at => at >= shift.startsAt && at < shift.endsAt))
    .flatMap(shift => momentIn(shift, bedside))
  return [...changes.map(at => checkAt(bedside, at, true)), ...looks.map(at => checkAt(bedside, at, false))]
}

/** A check of every place, as it is charted at most beds. */
export function checkAt(bedside: Bedside, at: Date, changesDressing: boolean, more: Partial<StomaData> = {}): Draft {
  const { random, story } = bedside
  const tube = tubeAt(bedside, at)
  const hasSutures = tube?.sutures === 'in place'
  const second = placeAt(bedside, at).ward.row.name
  const skin = story.skin && since(hoursBefore(bedside.now, story.skin.sinceHoursAgo), at) >= 0 ? story.skin.found : {}
  const data: StomaData = {
    appearance: ['clean'],
    ...exudate(bedside),
    bleeding: 'none',
    ...(random.chance(0.6) ? { pain: random.pick([0, 0, 1, 2]) } : {}),
    sites: tube
      ? [...everyPlace, ...(hasSutures ? (['under sutures'] as const) : [])]
      : ['around opening', 'back of neck'],
    skin: 'intact',
    ...(changesDressing
      ? {
          dressing: 'changed',
          dressingType: random.pick(['foam', 'absorbent']),
          secondPerson: secondPerson(second, random),
        }
      : { dressing: tube ? 'left in place' : 'none' }),
    sutures: hasSutures ? 'in place' : 'none',
    ties: tube ? random.pick(['one', 'two', 'two']) : 'no ties',
    holderChanged: changesDressing && tube && random.chance(0.6) ? 'yes' : 'no',
    ...skin,
    ...more,
  }
  return draft(stomaChecks, at, data)
}

const everyPlace: readonly SkinSite[] = ['flange left', 'flange right', 'flange top', 'flange bottom', 'back of neck']

function exudate({ story, random }: Bedside): Pick<StomaData, 'exudate' | 'exudateType'> {
  if (story.secretions === 'thin' || random.chance(0.5)) return { exudate: 'none' }
  return { exudate: 'scant', exudateType: random.pick(['clear', 'cloudy']) }
}

/** Health care assistants help with dressings and chart nothing themselves. */
export function secondPerson(ward: string, random: Bedside['random']): string {
  return random.pick(
    ward === 'Birch ward' ? ['E. Quillfeather', 'S. Nwachukwu'] : ['M. Tarrantish', 'L. Okumah', 'alone'],
  )
}
