import { earlier, hours } from '#app/time/duration.ts'
import { idAt, randomFrom } from './random.ts'
import type { DemoBed, DemoWard } from './rows.ts'

export type WardName = 'Alder ward' | 'Birch ward' | 'Cedar ward'

interface WardPlan extends Omit<DemoWard, 'id'> {
  readonly name: WardName
  readonly letter: string
  readonly beds: number
  /** The ward's own upper limit of cuff pressure in cmH2O, where it departs from the hospital's. */
  readonly cuffUpperLimit?: number
}

const emergencyNumbers = [
  { who: 'Airway team', number: '2222' },
  { who: 'Anaesthetist on call', number: '405 by bleep' },
  { who: 'Intensive care', number: '4410' },
]

const plans: readonly WardPlan[] = [
  {
    name: 'Alder ward',
    letter: 'A',
    beds: 14,
    shiftTimes: ['07:00', '15:00', '23:00'],
    pressureUnit: 'cmH2O',
    emergencyNumbers,
  },
  { name: 'Birch ward', letter: 'B', beds: 12, shiftTimes: ['07:30', '19:30'], pressureUnit: 'mmHg', emergencyNumbers },
  {
    name: 'Cedar ward',
    letter: 'C',
    beds: 10,
    shiftTimes: ['07:00', '15:00', '23:00'],
    pressureUnit: 'cmH2O',
    emergencyNumbers,
    cuffUpperLimit: 25,
  },
]

export interface WardWithBeds {
  readonly row: DemoWard & { readonly name: WardName }
  readonly beds: readonly DemoBed[]
  readonly cuffUpperLimit: number | undefined
}

/** The three wards with their beds; their ids are older than everything that happened in them. */
export function demoWards(now: Date): readonly WardWithBeds[] {
  const openedAt = earlier(now, hours(60 * 24))
  return plans.map(({ letter, beds, cuffUpperLimit, ...plan }) => {
    const random = randomFrom(`${plan.name} ${now.getTime()}`)
    const row = { id: idAt(openedAt, random), ...plan }
    return { row, cuffUpperLimit, beds: Array.from({ length: beds }, (_, index) => bed(index + 1)) }

    function bed(position: number): DemoBed {
      return { id: idAt(openedAt, random), wardId: row.id, label: `${letter}${position}`, position }
    }
  })
}

/** The bed with that label, such as `A3`. Throws RangeError when the plan has none. */
export function bedLabelled(wards: readonly WardWithBeds[], label: string): DemoBed {
  const bed = wards.flatMap(ward => ward.beds).find(other => other.label === label)
  if (!bed) throw new RangeError(`The demo hospital has no bed ${label}`)
  return bed
}
