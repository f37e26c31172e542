import type { Role } from '#app/auth/permissions.ts'
import { earlier, hours } from '#app/time/duration.ts'
import { shiftAt } from '#app/time/shift.ts'
import type { Zone } from '#app/time/zone.ts'
import { idAt, randomFrom } from './random.ts'
import type { DemoBed, DemoPerson } from './rows.ts'
import type { WardName, WardWithBeds } from './wards.ts'

type Plan = readonly [name: string, role: Role, ...wards: WardName[]]

const plans: readonly Plan[] = [
  ['Imani Brathwaite', 'nurse', 'Alder ward'],
  ['Tomasz Grelewski', 'nurse', 'Alder ward'],
  ['Niamh Carrowell', 'nurse', 'Alder ward'],
  ['Joaquín Salmerón', 'nurse', 'Alder ward'],
  ['Hye-jin Paek', 'nurse', 'Alder ward'],
  ['Abena Frimpong-Wells', 'nurse', 'Alder ward'],
  ['Lucien Abadier', 'nurse', 'Birch ward'],
  ['Sunniva Hjellestad', 'nurse', 'Birch ward'],
  ['Farouk Ben Idirsaid', 'nurse', 'Birch ward'],
  ['Mairead Tolcarne', 'nurse', 'Birch ward'],
  ['Dagný Hallsdóttir', 'nurse', 'Birch ward'],
  ['Prosper Mwakalinga', 'nurse', 'Birch ward'],
  ['Rhoswen Pryderch', 'nurse', 'Cedar ward'],
  ['Emre Taşdelenli', 'nurse', 'Cedar ward'],
  ['Josefina Arrupe', 'nurse', 'Cedar ward'],
  ['Wanjiru Thimba', 'nurse', 'Cedar ward'],
  ['Kristýna Hlaváčová', 'nurse', 'Cedar ward'],
  ['Desmond Larkhill', 'nurse', 'Cedar ward'],
  ['Odalys Verstraeten', 'charge nurse', 'Alder ward'],
  ['Gethin Maddern', 'charge nurse', 'Birch ward'],
  ['Chiamaka Ezeobi', 'charge nurse', 'Cedar ward'],
  ['Kofi Lindstrand', 'respiratory therapist', 'Alder ward', 'Birch ward'],
  ['Mirela Dragoșanu', 'respiratory therapist', 'Birch ward', 'Cedar ward'],
  ['Ingrid Solheim-Adeyemi', 'tracheostomy specialist', 'Alder ward', 'Birch ward', 'Cedar ward'],
  ['Percival Okonhale', 'educator'],
  ['Rosalind Thornbeck', 'administrator'],
  ['Saoirse Vandeputten', 'observer', 'Alder ward'],
]

const students: readonly Plan[] = [['Elodie Varnhagen', 'nurse', 'Alder ward']]

/** Everybody with an account: all roles, six nurses a ward, and a student nurse. */
export function demoPeople(now: Date, wards: readonly WardWithBeds[]): readonly DemoPerson[] {
  const random = randomFrom(`people ${now.getTime()}`)
  const addedAt = earlier(now, hours(45 * 24))
  const taken = new Map<string, number>()
  return [...plans, ...students].map(([name, role, ...wardNames], index) => ({
    id: idAt(addedAt, random),
    name,
    email: `${addressOf(index < plans.length ? role : 'student', wardNames, taken)}@example.org`,
    role,
    supervised: index >= plans.length,
    wardIds: wards.filter(ward => wardNames.includes(ward.row.name)).map(ward => ward.row.id),
    addedAt,
  }))
}

/** `nurse.alder`, then `nurse2.alder`; without a single ward only `specialist`. */
function addressOf(role: Role | 'student', wardNames: readonly WardName[], taken: Map<string, number>): string {
  const word = role === 'charge nurse' ? 'charge' : (role.split(' ').at(-1) ?? role)
  const [first, ...others] = wardNames
  const ward = first && others.length < 2 ? `.${first.split(' ')[0]?.toLowerCase()}` : ''
  const count = (taken.get(word + ward) ?? 0) + 1
  taken.set(word + ward, count)
  return `${word}${count === 1 ? '' : count}${ward}`
}

/** Who was on duty, so that entries carry the names of the people who worked that shift. */
export interface Rota {
  /** The nurse who had the bed at that moment. */
  nurse(ward: WardWithBeds, bed: DemoBed, at: Date): DemoPerson
  /** The first person of a role who belongs to the ward. */
  lead(ward: WardWithBeds, role: Role): DemoPerson
}

const NURSES_ON_DUTY = 2

/** Two nurses a shift in turn: one has the first beds of the ward, the other the rest. */
export function rotaOf(people: readonly DemoPerson[], zone: Zone): Rota {
  function members(ward: WardWithBeds, role: Role): readonly DemoPerson[] {
    return people.filter(person => person.role === role && !person.supervised && person.wardIds.includes(ward.row.id))
  }
  function one(found: DemoPerson | undefined, role: Role, ward: WardWithBeds): DemoPerson {
    if (!found) throw new RangeError(`${ward.row.name} has no ${role}`)
    return found
  }
  return {
    nurse(ward, bed, at) {
      const nurses = members(ward, 'nurse')
      const { startsAt, endsAt } = shiftAt(at, ward.row.shiftTimes, zone)
      const shift = Math.round(startsAt.getTime() / (endsAt.getTime() - startsAt.getTime()))
      const half = bed.position * NURSES_ON_DUTY <= ward.beds.length ? 0 : 1
      return one(nurses[(shift * NURSES_ON_DUTY + half) % nurses.length], 'nurse', ward)
    },
    lead: (ward, role) => one(members(ward, role)[0], role, ward),
  }
}
