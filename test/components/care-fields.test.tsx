import { render, screen, within } from '@testing-library/react'
import userEvent from '@testing-library/user-event'
import { renderToStaticMarkup } from 'react-dom/server'
import { expect, test } from 'vitest'
import { careFields, choice, fieldsOf, note, quantity, text } from '#app/care/field.ts'
import { CareFields, type CareFieldsProps } from '#app/components/care-fields.tsx'
import { drawnFields } from '#app/components/conform-fields.ts'

const schema = careFields({
  found: quantity({ label: 'Pressure found', unitField: 'unit', min: 0, max: 120, step: 0.1, large: true }),
  unit: choice({ label: 'Unit on the gauge', options: { cmH2O: 'cmH2O', mmHg: 'mmHg' } }),
  method: choice({ label: 'Method', options: { manometer: 'Manometer', none: 'Not measured' } }).optional(),
  whyNot: text({ label: 'Why not', when: { field: 'method', is: ['none'] }, neededThen: true }).optional(),
  note: note({ label: 'Note', more: true }).optional(),
})
const upper = {
  label: 'Upper limit',
  value: '30 cmH2O',
  origin: 'Policy',
  source: 'A paper',
  standing: 'published',
} as const
const why = { rule: ['In range from 20 to 30 cmH2O.'], values: [upper], policy: 'Care, version 2.' } as const
const band = { field: 'found', unitField: 'unit', lower: 20, upper: 30, max: 50, unit: 'cmH2O', why }

type Given = Readonly<Record<string, { readonly answer?: string; readonly errors?: string[] }>>

function drawn(given: Given = {}): CareFieldsProps {
  const fields = fieldsOf(schema)
  const state = fields.map(({ name }) => {
    const { answer, errors } = given[name] ?? {}
    return [
      name,
      {
        id: `form-${name}`,
        key: undefined,
        name: `care.${name}`,
        defaultValue: answer,
        defaultOptions: undefined,
        errors,
      },
    ]
  })
  return { fields: drawnFields(fields, Object.fromEntries(state)), gauges: [band] }
}

function form(given: Given = { unit: { answer: 'cmH2O' } }) {
  const { container } = render(
    <form>
      <CareFields {...drawn(given)} />
    </form>,
  )
  const submitted = () => [...new FormData(container.querySelector('form') ?? undefined)].map(([name]) => name)
  return { submitted }
}

test('every field has its label, and choices are named by their question', () => {
  form()
  expect(screen.getByRole('textbox', { name: 'Pressure found' })).toHaveAttribute('name', 'care.found')
  expect(within(screen.getByRole('group', { name: 'Unit on the gauge' })).getAllByRole('radio')).toHaveLength(2)
})

test('the unit beside a number is the one that was chosen', async () => {
  form()
  const found = screen.getByRole('textbox', { name: 'Pressure found' })
  expect(found).toHaveAccessibleDescription('cmH2O')
  await userEvent.click(screen.getByRole('radio', { name: 'mmHg' }))
  expect(found).toHaveAccessibleDescription('mmHg')
})

test('a number is read against its band while it is typed, in whatever unit', async () => {
  form()
  await userEvent.type(screen.getByRole('textbox', { name: 'Pressure found' }), '34')
  expect(screen.getByRole('status')).toHaveTextContent('above 30')
  await userEvent.click(screen.getByRole('radio', { name: 'mmHg' }))
  expect(screen.getByRole('status')).toHaveTextContent('46.2 cmH2O, above 30')
})

test('a band says why it lies there: the rule, its numbers with their source, and the policy', async () => {
  form()
  const asked = screen.getByText('The band of: Pressure found').closest('details')
  expect(asked).not.toHaveAttribute('open')
  await userEvent.click(screen.getByText('The band of: Pressure found'))
  expect(asked).toHaveAttribute('open')
  expect(asked).toHaveTextContent(
    'Why? The band of: Pressure foundIn range from 20 to 30 cmH2O.Upper limit: 30 cmH2O. Policy. A paper. publishedCare, version 2.',
  )
})

test('keys type into the number', async () => {
  form()
  const keys = within(screen.getByRole('group', { name: 'Keys for Pressure found', hidden: true }))
  for (const key of ['2', '6', 'Point', '5', 'Delete last'])
    await userEvent.click(keys.getByRole('button', { name: key, hidden: true }))
  expect(screen.getByRole('textbox', { name: 'Pressure found' })).toHaveValue('26.')
  expect(screen.getByRole('status')).toHaveTextContent('in range, 20 to 30')
})

test('a comma is written as a point', async () => {
  form()
  const found = screen.getByRole('textbox', { name: 'Pressure found' })
  await userEvent.type(found, '26,5')
  await userEvent.tab()
  expect(found).toHaveValue('26.5')
})

test('a question is submitted only when it arises', async () => {
  const { submitted } = form()
  expect(submitted()).not.toContain('care.whyNot')
  await userEvent.click(screen.getByRole('radio', { name: 'Not measured' }))
  expect(submitted()).toContain('care.whyNot')
  await userEvent.click(screen.getByRole('button', { name: 'Clear Method' }))
  expect(submitted()).not.toContain('care.whyNot')
  expect(submitted()).not.toContain('care.method')
})

test('without scripts every question is there, with its condition in words', () => {
  const html = renderToStaticMarkup(<CareFields {...drawn()} />)
  expect(html).toContain('Only if &quot;Method&quot; is: Not measured.')
  expect(html).not.toContain('disabled=""')
})

test('an error is said with its field', () => {
  form({ unit: { answer: 'cmH2O' }, found: { answer: '134', errors: ['Pressure found must be from 0 to 120'] } })
  const found = screen.getByRole('textbox', { name: 'Pressure found' })
  expect(found).toBeInvalid()
  expect(found).toHaveAccessibleDescription('Pressure found must be from 0 to 120 cmH2O')
  expect(found).toHaveValue('134')
})

test('an error among the details that are kept out of the way opens them', () => {
  form({ note: { errors: ['Note must be at most 2000 characters'] } })
  expect(screen.getByText('More details').closest('details')).toHaveAttribute('open')
})
