import { Form } from 'react-router'
import { fieldsOf } from '#app/care/field.ts'
import type { ItemKind } from '#app/catalogue/columns.ts'
import { innerCannulaSchema } from '#app/catalogue/inner-cannula-schema.ts'
import { tubeSchema } from '#app/catalogue/tube-schema.ts'
import { Button, LinkButton } from './button.tsx'
import { CareFields } from './care-fields.tsx'
import { ChoiceField } from './choice-field.tsx'
import type { DrawnField } from './conform-fields.ts'
import { ErrorSummary } from './error-summary.tsx'

export interface ItemFormProps {
  readonly kind: ItemKind
  readonly id: string
  readonly version: number | null
  readonly typed: Readonly<Record<string, readonly string[]>>
  readonly errors: Readonly<Record<string, readonly string[]>>
  /** Inner cannulas of the tube's line, by id. */
  readonly fitting: Readonly<Record<string, string>>
  /** Fields that are settled already. */
  readonly without?: readonly string[]
  readonly words: string
  readonly cancelHref: string
}

/** What the catalogue says of an item, to fill in. */
export function ItemForm(props: ItemFormProps) {
  const { kind, id, version, typed, errors, fitting, without = [], words, cancelHref } = props
  const asked = fieldsOf(kind === 'tube' ? tubeSchema : innerCannulaSchema).filter(
    ({ name }) => !without.includes(name),
  )
  const fields = asked.map((field): DrawnField => {
    const { name } = field
    return { ...field, id: name, fullName: name, answers: typed[name] ?? [], errors: errors[name] }
  })
  const summary = ['', ...fields.map(({ name }) => name)].flatMap(name =>
    (errors[name] ?? []).map(says => (name === '' ? { says } : { fieldId: name, says })),
  )
  return (
    <Form method="post" noValidate className="grid max-w-3xl gap-5">
      <ErrorSummary title="Not saved yet. Please check:" errors={summary} />
      <input type="hidden" name="id" value={id} />
      {version !== null && <input type="hidden" name="version" value={version} />}
      <CareFields fields={fields} />
      {Object.keys(fitting).length > 0 && (
        <ChoiceField
          id="fits"
          name="fits"
          label="Inner cannulas that fit"
          hint="As the maker says. Nothing is concluded from a number."
          options={fitting}
          chosen={typed.fits ?? []}
          several
          optional
        />
      )}
      <div className="flex flex-wrap gap-3">
        <Button variant="primary" size={48}>
          {words}
        </Button>
        <LinkButton href={cancelHref} size={48}>
          Cancel
        </LinkButton>
      </div>
    </Form>
  )
}
