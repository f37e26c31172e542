import { type CurrentUser, can } from '#app/auth/permissions.ts'
import { fieldsOf } from '#app/care/field.ts'
import type { FieldMeta } from '#app/care/field-meta.ts'
import type { AnyCareKind, CareContext } from '#app/care/kind.ts'
import { careSettings } from '#app/care/kinds.ts'
import { showValue } from '#app/rules/why.ts'
import { membersOf } from '#database/users.server.ts'

/** Names of the fields of a kind that are drawn with this control. */
export function fieldsWith(kind: AnyCareKind, control: FieldMeta['control']): readonly string[] {
  return fieldsOf(kind.schema).flatMap(({ name, meta }) => (meta.control === control ? [name] : []))
}

/** Settings that a care plan may set for one patient: with unit, range and the value in force; and their units. */
export function personalSettings(context: CareContext | null) {
  const personal = careSettings.filter(setting => setting.personal)
  return {
    label: Object.fromEntries(
      personal.map(setting => {
        const { label, unit, min, max } = context?.values.judged(setting) ?? setting
        const now = context ? `, now ${showValue(context.values.shown(setting), unit)}` : ''
        return [setting.name, `${label}: ${min} to ${max} ${unit}${now}`]
      }),
    ),
    units: Object.fromEntries(personal.map(({ name, unit }) => [name, unit])),
  }
}

/** Who may stand as the second person of an act: those who chart on this ward, but for the one who signs. */
export async function witnessesFor(
  wardId: string,
  user: Pick<CurrentUser, 'id'>,
): Promise<Readonly<Record<string, string>>> {
  const members = await membersOf(wardId)
  const present = members.filter(
    ({ id, role }) => id !== user.id && can({ role, wardIds: [wardId] }, 'chart care', wardId),
  )
  return Object.fromEntries(present.map(({ id, name, role }) => [id, `${name}, ${role}`]))
}
