import { useState } from 'react'
import { Button } from './button.tsx'
import { Card } from './card.tsx'
import { describedBy, HintAndErrors, INPUT, isInvalid } from './field-parts.tsx'
import { JumpLinks } from './policy-sections.tsx'
import { Tag } from './tag.tsx'

/** One setting as a field. */
export interface SettingField {
  readonly name: string
  readonly label: string
  readonly unit: string
  readonly control: 'number' | 'switch' | 'list'
  readonly value: string
  /** As it is in force, and as the product comes. */
  readonly inForce: string
  readonly byDefault: string
  readonly range: string | null
  readonly affects: string
  readonly source: string
  readonly standing: string
  readonly error: string | null
}

export interface FieldSection {
  readonly id: string
  readonly title: string
  readonly fields: readonly SettingField[]
}

interface PolicyFieldsProps {
  readonly sections: readonly FieldSection[]
  /** Shown at first: words to look for, and only what differs from the version in force. */
  readonly find: string
  readonly changedOnly: boolean
}

/** Every number of a policy as a field. What is not looked for is hidden and stays in the form. */
export function PolicyFields({ sections, ...first }: PolicyFieldsProps) {
  const [find, setFind] = useState(first.find)
  const [changedOnly, setChangedOnly] = useState(first.changedOnly)
  const isShown = (field: SettingField) =>
    field.error !== null || ((!changedOnly || field.value !== field.inForce) && isAbout(field, find))
  const shown = new Set(sections.flatMap(({ fields }) => fields.filter(isShown).map(({ name }) => name)))
  const isEmpty = ({ fields }: FieldSection) => !fields.some(({ name }) => shown.has(name))
  return (
    <>
      <div className="grid gap-3 rounded-card border border-line bg-surface p-4 print:hidden">
        <label className="grid gap-1.5">
          <span className="font-semibold">Look for a setting</span>
          <input
            type="search"
            form="look"
            name="find"
            defaultValue={find}
            onChange={event => setFind(event.target.value)}
            className={`${INPUT} max-w-xl`}
          />
        </label>
        <label className="inline-flex min-h-11 items-center gap-3">
          <input
            type="checkbox"
            form="look"
            name="changed"
            defaultChecked={changedOnly}
            onChange={event => setChangedOnly(event.target.checked)}
            className="size-6 accent-brand"
          />
          <span className="font-semibold">Only what differs from the version in force</span>
        </label>
        <noscript>
          <Button form="look">Show</Button>
          <p className="text-sm text-ink2">Save the draft first: what was not saved is lost.</p>
        </noscript>
        <p role="status" className="text-ink2">
          {shown.size === 1 ? '1 setting' : `${shown.size} settings`} shown
        </p>
        <JumpLinks sections={sections.filter(section => !isEmpty(section))} />
      </div>
      {sections.map(section => (
        <div key={section.id} hidden={isEmpty(section)}>
          <Card id={section.id} title={section.title} flush className="scroll-mt-4">
            {section.fields.map(field => (
              <Setting key={field.name} field={field} hidden={!shown.has(field.name)} />
            ))}
          </Card>
        </div>
      ))}
    </>
  )
}

function isAbout({ label, affects, name }: SettingField, find: string): boolean {
  const words = find.toLowerCase().split(/\s+/).filter(Boolean)
  const text = `${label} ${affects} ${name}`.toLowerCase()
  return words.every(word => text.includes(word))
}

interface SettingProps {
  readonly field: SettingField
  readonly hidden: boolean
}

function Setting({ field, hidden }: SettingProps) {
  const { name, label, inForce, byDefault, range, affects, source, standing, error, unit } = field
  const id = `setting-${name}`
  const own = { id, name: `value.${name}`, label, hint: affects, errors: error === null ? undefined : [error] }
  const words = unit === 'on or off' ? '' : ` ${unit}`
  return (
    <div
      hidden={hidden}
      className="grid gap-x-6 gap-y-2 border-t border-hair px-4 py-3 first:border-0 md:grid-cols-[minmax(0,1fr)_minmax(0,1fr)]"
    >
      <div className="grid content-start gap-1.5">
        <label htmlFor={id} className="font-semibold">
          {label}
        </label>
        <div className="flex flex-wrap items-center gap-3">
          <Control field={field} own={own} />
          <span id={`${id}-unit`} className="text-ink2">
            {words}
          </span>
          {inForce !== field.value && <Tag tone="due">changed</Tag>}
        </div>
        <HintAndErrors field={own} />
      </div>
      <div className="grid content-start gap-1 text-sm text-ink2">
        <p>
          In force {inForce}
          {words}, product default {byDefault}
          {words}
          {range === null ? '' : `, allowed ${range}`}
        </p>
        <p>
          {source} <Tag>{standing}</Tag>
        </p>
      </div>
    </div>
  )
}

interface ControlProps extends Pick<SettingProps, 'field'> {
  readonly own: Parameters<typeof describedBy>[0]
}

function Control({ field: { control, value }, own }: ControlProps) {
  const { id, name } = own
  const about = { id, name, defaultValue: value, 'aria-invalid': isInvalid(own) }
  const described = describedBy(own, `${id}-unit`)
  if (control === 'switch')
    return (
      <select {...about} aria-describedby={described} className={`${INPUT} max-w-28`}>
        <option value="on">on</option>
        <option value="off">off</option>
      </select>
    )
  return (
    <input
      {...about}
      aria-describedby={described}
      autoComplete="off"
      inputMode={control === 'number' ? 'decimal' : 'text'}
      className={`${INPUT} ${control === 'number' ? 'max-w-28 text-lg font-semibold' : 'max-w-md'}`}
    />
  )
}
