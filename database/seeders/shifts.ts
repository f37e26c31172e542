import { earlier, later, minutes } from '#app/time/duration.ts'
import { nextShift, type Shift, shiftAt } from '#app/time/shift.ts'
import { type Bedside, hoursBefore } from './bedside.ts'

/** How care of every shift stands: done in this shift, not yet in this one, not in the last one either. */
export type ShiftStanding = 'done' | 'due' | 'missed'

/** How many of the latest shifts are without the act. */
export const leftOut: Readonly<Record<ShiftStanding, number>> = { done: 0, due: 1, missed: 2 }

/** The shifts of the stay in which there was something to look after, latest first. */
export function shiftsOf(bedside: Bedside): readonly Shift[] {
  const { shiftTimes } = bedside.place.ward.row
  const shifts: Shift[] = []
  let shift = shiftAt(careFrom(bedside), shiftTimes, bedside.zone)
  while (shift.startsAt <= bedside.until) {
    shifts.unshift(shift)
    shift = nextShift(shift, shiftTimes, bedside.zone)
  }
  return shifts
}

const careFrom = ({ tubes, admittedAt }: Bedside): Date => later(tubes[0]?.from ?? admittedAt, minutes(10))

/** A minute of the part of a shift that lies within the stay; none when that part has hardly begun. */
export function momentIn(shift: Shift, bedside: Bedside): readonly Date[] {
  const from = Math.max(later(shift.startsAt, minutes(2)).getTime(), careFrom(bedside).getTime())
  const to = Math.min(earlier(shift.endsAt, minutes(30)).getTime(), bedside.until.getTime() - minutes(1))
  return to <= from ? [] : [hoursBefore(new Date(bedside.random.between(from, to)), 0)]
}
