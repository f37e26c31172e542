import { type StomaData, stomaChecks } from '#app/care/stoma-and-skin/schema.ts'
import { type TieData, tieChecks } from '#app/care/ties/schema.ts'
import { tieChangeInterval } from '#app/care/ties/settings.ts'
import { later, minutes } from '#app/time/duration.ts'
import { type Bedside, placeAt, tubeAt } from './bedside.ts'
import { secondPerson } from './chart-stoma.ts'
import { type Draft, draft } from './draft.ts'
import { momentIn, shiftsOf } from './shifts.ts'

/** Looks at the ties in shifts without a check of stoma and skin, and changes where none came with a dressing or a tube for a day. */
export function tieCare(bedside: Bedside, stoma: readonly Draft[]): readonly Draft[] {
  if (bedside.tubes.length === 0) return []
  const [, ...before] = shiftsOf(bedside)
  const looks = before
    .filter(shift => !stoma.some(({ at }) => at >= shift.startsAt && at < shift.endsAt))
    .flatMap(shift => momentIn(shift, bedside))
  return [
    ...looks.map(at => lookAt(bedside, at, {})),
    ...changesBetween(bedside, stoma).map(at => lookAt(bedside, at, changed(bedside, at))),
  ].filter(({ at }) => tubeAt(bedside, at) !== undefined)
}

/** About a day after each change of the ties came another one. */
function changesBetween(bedside: Bedside, stoma: readonly Draft[]): readonly Date[] {
  const { tubes, until, admittedAt, random } = bedside
  const known = [
    ...tubes.filter(({ putInHere }) => putInHere).map(({ from }) => from),
    ...stoma.filter(({ kind, data }) => kind === stomaChecks && isChange(data as StomaData)).map(({ at }) => at),
    until,
  ].toSorted((a, b) => a.getTime() - b.getTime())
  const added: Date[] = []
  let last = tubes[0]?.putInHere ? tubes[0].from : admittedAt
  for (const next of known) {
    for (let due = again(last); due < next; due = again(due)) {
      added.push(due)
      last = due
    }
    last = next
  }
  return added

  function again(from: Date): Date {
    const ms = later(from, minutes(60 * (tieChangeInterval.default - random.between(0.5, 4)))).getTime()
    return new Date(ms - (ms % 60_000))
  }
}

const isChange = ({ holderChanged }: StomaData): boolean => holderChanged === 'yes'

function changed(bedside: Bedside, at: Date): Partial<TieData> {
  return { changed: 'yes', secondPerson: secondPerson(placeAt(bedside, at).ward.row.name, bedside.random) }
}

function lookAt({ random }: Bedside, at: Date, more: Partial<TieData>): Draft {
  const fingers = random.pick(['one', 'two', 'two'])
  return draft(tieChecks, at, { fingers, skin: 'intact', changed: 'no', holder: 'padded', ...more })
}
