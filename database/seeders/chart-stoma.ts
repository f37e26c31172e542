import { type SkinSite, type StomaData, stomaChecks } from '#app/care/stoma-and-skin/schema.ts'
import { dressingInterval } from '#app/care/stoma-and-skin/settings.ts'
import { earlier, later, minutes, since } from '#app/time/duration.ts'
import { nextShift, type Shift, shiftAt } from '#app/time/shift.ts'
import { type Bedside, hoursBefore, pacedTimes, placeAt, tubeAt } from './bedside.ts'
import { type Draft, draft } from './draft.ts'

/** Checks of stoma and skin: one in each shift, and those at which the dressing was changed. */
export function stomaCare(bedside: Bedside): readonly Draft[] {
  const { dressing } = bedside.story.stands
  const changes =
    dressing === undefined ? [] : pacedTimes(bedside, { every: dressingInterval.default, pastDue: dressing })
  const looks = shiftsToLookIn(bedside)
    .filter(shift => !changes.some(at => at >= shift.startsAt && at < shift.endsAt))
    .flatMap(shift => momentIn(shift, bedside))
  return [...changes.map(at => checkAt(bedside, at, true)), ...looks.map(at => checkAt(bedside, at, false))]
}

/** The shifts of the stay, latest first, without those in which the story has nobody look. */
function shiftsToLookIn(bedside: Bedside): readonly Shift[] {
  const { until, story } = bedside
  const start = careFrom(bedside)
  const shifts: Shift[] = []
  const { shiftTimes } = bedside.place.ward.row
  let shift = shiftAt(start, shiftTimes, bedside.zone)
  while (shift.startsAt <= until) {
    shifts.unshift(shift)
    shift = nextShift(shift, shiftTimes, bedside.zone)
  }
  const leftOut = { done: 0, due: 1, missed: 2 }
  return shifts.slice(leftOut[story.stands.stoma])
}

const careFrom = ({ tubes, admittedAt }: Bedside): Date => later(tubes[0]?.from ?? admittedAt, minutes(10))

/** A minute of the part of a shift that lies within the stay; none when that part has hardly begun. */
function momentIn(shift: Shift, bedside: Bedside): readonly Date[] {
  const from = Math.max(later(shift.startsAt, minutes(2)).getTime(), careFrom(bedside).getTime())
  const to = Math.min(earlier(shift.endsAt, minutes(30)).getTime(), bedside.until.getTime() - minutes(1))
  return to <= from ? [] : [hoursBefore(new Date(bedside.random.between(from, to)), 0)]
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
function secondPerson(ward: string, random: Bedside['random']): string {
  return random.pick(
    ward === 'Birch ward' ? ['E. Quillfeather', 'S. Nwachukwu'] : ['M. Tarrantish', 'L. Okumah', 'alone'],
  )
}
