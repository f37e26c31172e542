import { supervisedRole } from '../care/supervision.ts'

/** What somebody is at work. It is stored with every act, as it was at that moment. */
export const roles = [
  'nurse',
  'respiratory therapist',
  'charge nurse',
  'tracheostomy specialist',
  'educator',
  'administrator',
  'observer',
] as const
export type Role = (typeof roles)[number]

/** The person at the keyboard. `wardIds` are the wards they belong to; `sessionHash` names the session in the access log. */
export type CurrentUser = {
  readonly id: string
  readonly name: string
  readonly email: string
  readonly role: Role
  readonly wardIds: readonly string[]
  readonly sessionHash: string
  /** Charts under supervision, such as a student: what they chart waits for a countersignature. */
  readonly isSupervised: boolean
}

/** `own wards`: only where the person is a member. `everywhere`: no ward is asked. */
type Reach = 'own wards' | 'everywhere'
type Allowance = { readonly [role in Role]?: Reach }

const bedside = {
  nurse: 'own wards',
  'respiratory therapist': 'own wards',
  'charge nurse': 'own wards',
  'tracheostomy specialist': 'own wards',
} as const satisfies Allowance

const nursing = { nurse: 'own wards', 'charge nurse': 'own wards' } as const satisfies Allowance

const leading = { 'charge nurse': 'own wards', 'tracheostomy specialist': 'own wards' } as const satisfies Allowance

const everybody = {
  nurse: 'everywhere',
  'respiratory therapist': 'everywhere',
  'charge nurse': 'everywhere',
  'tracheostomy specialist': 'everywhere',
  educator: 'everywhere',
  administrator: 'everywhere',
  observer: 'everywhere',
} as const satisfies Allowance

/**
 * Who may do what; what is not written here is refused.
 * An educator works with people, policy and measures and needs no patient, so sees none. An administrator keeps people,
 * wards and the catalogue and sees no patient either. An observer reads, in the wards they belong to and nowhere else.
 */
const permissions = {
  'see ward': { ...bedside, observer: 'own wards' },
  'see patients': { ...bedside, observer: 'own wards' },
  'chart care': bedside,
  'correct own entries': bedside,
  'retract own entries': bedside,
  'correct entries': leading,
  'retract entries': leading,
  'keep supplies': bedside,
  'admit patients': { ...nursing, 'tracheostomy specialist': 'own wards' },
  'move patients': nursing,
  'discharge patients': nursing,
  'edit patient details': { ...nursing, 'tracheostomy specialist': 'own wards' },
  'set care plans': leading,
  'see tubes of wards': leading,
  countersign: bedside,
  'see competence gaps': { ...leading, educator: 'everywhere' },
  'sign off competence': { educator: 'everywhere' },
  'assign patients': { 'charge nurse': 'own wards' },
  'see policy': {
    ...bedside,
    educator: 'everywhere',
    administrator: 'everywhere',
    observer: 'own wards',
  },
  'manage policy': leading,
  'see measures': { ...bedside, educator: 'everywhere' },
  'see access log': { 'charge nurse': 'own wards' },
  'open patients elsewhere': {
    nurse: 'everywhere',
    'respiratory therapist': 'everywhere',
    'charge nurse': 'everywhere',
    'tracheostomy specialist': 'everywhere',
  },
  'manage people': { administrator: 'everywhere' },
  'manage wards': { administrator: 'everywhere' },
  'see catalogue': everybody,
  'manage catalogue': { administrator: 'everywhere', 'tracheostomy specialist': 'everywhere' },
  // An administrator learns how many patients of which ward had a lot, and who goes to them; not which patients.
  'trace lots': { ...bedside, administrator: 'everywhere' },
  'recall lots': { administrator: 'everywhere', 'tracheostomy specialist': 'everywhere' },
} as const satisfies Record<string, Allowance>

/** Something a person may or may not do, in words. */
export type Act = keyof typeof permissions

export const acts = Object.keys(permissions) as readonly Act[]

/** What a reason opens on another ward's patient: the bedside, not that ward's decisions. */
const actsByGrant: readonly Act[] = ['see patients', 'chart care', 'correct own entries', 'retract own entries']

/** What is left to somebody under supervision of all that their role may do. */
const actsUnderSupervision: readonly Act[] = [
  'see ward',
  'see patients',
  'chart care',
  'correct own entries',
  'retract own entries',
  'see policy',
  'see measures',
  'see catalogue',
]

/** Whoever asks; without `isSupervised` the answer is that of a registered colleague in the role. */
type Asker = Pick<CurrentUser, 'role' | 'wardIds'> & { readonly isSupervised?: boolean }

/**
 * Whether the person may do this, in this ward. Without a ward it answers for at least one of their wards, which is
 * enough to show a link and never enough to let an action through.
 */
export function can(user: Asker, act: Act, wardId?: string): boolean {
  if (user.isSupervised && !actsUnderSupervision.includes(act)) return false
  const allowance: Allowance = permissions[act]
  const reach = allowance[user.role]
  if (reach === undefined) return false
  if (reach === 'everywhere') return true
  return wardId === undefined ? user.wardIds.length > 0 : user.wardIds.includes(wardId)
}

/** Whether the person may do this for a patient of a ward that is not theirs, once they have given a reason. */
export function canByGrant(user: Asker, act: Act): boolean {
  return can(user, 'open patients elsewhere') && actsByGrant.includes(act)
}

/** Who signs, in the role that the record keeps of them: under supervision it says so for good. */
export function authorOf({ id, role, isSupervised }: Pick<CurrentUser, 'id' | 'role' | 'isSupervised'>): {
  readonly id: string
  readonly role: string
} {
  return { id, role: isSupervised ? supervisedRole(role) : role }
}
