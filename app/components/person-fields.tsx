import type { FieldMetadata } from '@conform-to/react'
import { ChoiceField } from './choice-field.tsx'
import { TextField } from './text-field.tsx'
import { chosenOf, textOf } from './text-of.ts'

type PersonFieldName = 'name' | 'email' | 'role' | 'wardIds' | 'supervised'

export interface PersonFieldsProps {
  readonly fields: Readonly<Record<PersonFieldName, FieldMetadata<unknown>>>
  readonly roles: readonly string[]
  readonly wards: readonly { readonly id: string; readonly name: string }[]
}

/** Name, address, role and wards, as for a new person and for one who changes. */
export function PersonFields({ fields: { name, email, role, wardIds, supervised }, roles, wards }: PersonFieldsProps) {
  return (
    <>
      <TextField key={name.key} {...textOf(name)} label="Name" hint="As colleagues know them" autoComplete="off" />
      <TextField key={email.key} {...textOf(email)} label="E-mail address" type="email" autoComplete="off" />
      <ChoiceField
        {...chosenOf(role)}
        label="Role"
        options={Object.fromEntries(roles.map(one => [one, one.charAt(0).toUpperCase() + one.slice(1)]))}
      />
      <ChoiceField
        {...chosenOf(wardIds)}
        label="Wards"
        hint="They see the patients of these wards, if their role sees patients."
        options={Object.fromEntries(wards.map(ward => [ward.id, ward.name]))}
        several
      />
      <div>
        <label className="flex min-h-11 items-center gap-3 font-semibold">
          <input
            key={supervised.key}
            type="checkbox"
            name={supervised.name}
            defaultChecked={supervised.defaultChecked}
            aria-describedby={`${supervised.id}-description`}
            className="size-5 flex-none"
          />
          Charts under supervision
        </label>
        <p id={`${supervised.id}-description`} className="text-sm text-ink2">
          For students and assistants: what they chart counts, and waits for a registered colleague to countersign it.
        </p>
      </div>
    </>
  )
}
