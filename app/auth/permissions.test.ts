import { expect, test } from 'vitest'
import { type Act, acts, authorOf, can, canByGrant, type Role, roles } from './permissions.ts'

const inside = 'ward-inside'
const outside = 'ward-outside'

/** The expected table, one letter a role in the order of `roles`: `w` in own wards, `e` everywhere, `-` never. */
const expected: Record<Act, string> = {
  //                         nurse, respiratory therapist, charge nurse, specialist, educator, administrator, observer
  'see ward': 'wwww--w',
  'see patients': 'wwww--w',
  'chart care': 'wwww---',
  'correct own entries': 'wwww---',
  'retract own entries': 'wwww---',
  'correct entries': '--ww---',
  'retract entries': '--ww---',
  'keep supplies': 'wwww---',
  'admit patients': 'w-ww---',
  'move patients': 'w-w----',
  'discharge patients': 'w-w----',
  'edit patient details': 'w-ww---',
  'set care plans': '--ww---',
  'see tubes of wards': '--ww---',
  countersign: 'wwww---',
  'see competence gaps': '--wwe--',
  'sign off competence': '----e--',
  'assign patients': '--w----',
  'see policy': 'wwwweew',
  'manage policy': '--ww---',
  'see measures': 'wwwwe--',
  'see access log': '--w----',
  'open patients elsewhere': 'eeee---',
  'manage people': '-----e-',
  'manage wards': '-----e-',
  'see catalogue': 'eeeeeee',
  'manage catalogue': '---e-e-',
  'trace lots': 'wwww-e-',
  'recall lots': '---e-e-',
}

const rows = acts.flatMap(act => roles.map((role, at) => [role, act, expected[act][at]] as const))

test.each(rows)('%s, %s: %s', (role, act, reach) => {
  const user = { role, wardIds: [inside] }
  expect(can(user, act, inside)).toBe(reach !== '-')
  expect(can(user, act, outside)).toBe(reach === 'e')
  expect(can(user, act)).toBe(reach !== '-')
})

test('somebody without a ward may do nothing that belongs to a ward', () => {
  const allowed = acts.filter(act => can({ role: 'charge nurse', wardIds: [] }, act))
  expect(allowed).toEqual(['open patients elsewhere', 'see catalogue'])
})

test('the two roles that keep the house see no patient', () => {
  const blind: readonly Role[] = ['educator', 'administrator']
  for (const role of blind) expect(can({ role, wardIds: [inside] }, 'see patients', inside)).toBe(false)
})

test('a grant opens the bedside and none of the other ward’s decisions', () => {
  const nurse = { role: 'nurse', wardIds: [inside] } as const
  expect(acts.filter(act => canByGrant(nurse, act))).toEqual([
    'see patients',
    'chart care',
    'correct own entries',
    'retract own entries',
  ])
})

test('a grant opens nothing for somebody who may not look elsewhere', () => {
  for (const role of ['educator', 'administrator', 'observer'] as const) {
    expect(acts.filter(act => canByGrant({ role, wardIds: [inside] }, act))).toEqual([])
  }
})

test('somebody under supervision charts and puts right their own, and decides nothing', () => {
  for (const role of ['nurse', 'charge nurse', 'tracheostomy specialist'] as const) {
    const student = { role, wardIds: [inside], isSupervised: true }
    expect(acts.filter(act => can(student, act, inside))).toEqual([
      'see ward',
      'see patients',
      'chart care',
      'correct own entries',
      'retract own entries',
      'see policy',
      'see measures',
      'see catalogue',
    ])
    expect(acts.filter(act => canByGrant(student, act))).toEqual([])
  }
})

test('the record keeps that somebody charted under supervision', () => {
  expect(authorOf({ id: '1', role: 'nurse', isSupervised: true })).toEqual({ id: '1', role: 'nurse under supervision' })
  expect(authorOf({ id: '1', role: 'nurse', isSupervised: false })).toEqual({ id: '1', role: 'nurse' })
})
