import { Form } from 'react-router'
import { Button } from './button.tsx'
import { SelectField, TextField } from './text-field.tsx'

/** What a list of the catalogue asks for, as words of its address. */
export interface CatalogueFilterProps {
  readonly ask: Readonly<
    Record<'items' | 'find' | 'line' | 'sizeSystem' | 'cuff' | 'construction' | 'retired' | 'order', string>
  >
  readonly lines: readonly { readonly id: string; readonly line: string }[]
}

const kinds = { tubes: 'Tubes', 'inner-cannulas': 'Inner cannulas' }
const orders = {
  line: 'Line and size',
  od: 'Outside diameter',
  id: 'Inside diameter, inner cannula in',
  length: 'Length',
}

const narrowing = ['line', 'sizeSystem', 'cuff', 'construction'] as const
const COLUMNS = 'grid items-start gap-4 sm:grid-cols-2 lg:grid-cols-4'

/** What is looked for in the catalogue. Sent as an address, so that a list can be kept and passed on. */
export function CatalogueFilter({ ask, lines }: CatalogueFilterProps) {
  const of = (name: keyof typeof ask) => ({ id: name, name, defaultValue: ask[name] })
  const byLine = Object.fromEntries(lines.map(({ id, line }) => [id, line]))
  const isTubes = ask.items === 'tubes'
  const isNarrowed = ask.retired === 'yes' || ask.order !== 'line' || narrowing.some(name => ask[name] !== '')
  return (
    <Form role="search" className="grid gap-3 rounded-card border border-line bg-surface p-4">
      <div className={COLUMNS}>
        <SelectField {...of('items')} label="List" options={kinds} />
        <TextField {...of('find')} label="Find" hint="Line, maker, size or GTIN" maxLength={100} autoComplete="off" />
      </div>
      <details open={isNarrowed}>
        <summary className="inline-flex min-h-11 items-center font-semibold text-brand underline underline-offset-3">
          Filter and sort
        </summary>
        <div className={`${COLUMNS} mt-2`}>
          <SelectField {...of('line')} label="Line" options={byLine} nothing="All" />
          {isTubes && <TubeFilters of={of} />}
          <SelectField {...of('retired')} label="Retired" options={{ no: 'Left out', yes: 'Shown too' }} />
        </div>
      </details>
      <Button className="justify-self-start">Show</Button>
    </Form>
  )
}

interface TubeFiltersProps {
  readonly of: (name: keyof CatalogueFilterProps['ask']) => {
    readonly id: string
    readonly name: string
    readonly defaultValue: string
  }
}

function TubeFilters({ of }: TubeFiltersProps) {
  return (
    <>
      <SelectField
        {...of('sizeSystem')}
        label="Size system"
        options={{ 'ISO 5366': 'ISO 5366 (mm)', Jackson: 'Jackson' }}
        nothing="All"
      />
      <SelectField
        {...of('cuff')}
        label="Cuff"
        options={{ none: 'None', air: 'Air', water: 'Water', foam: 'Foam' }}
        nothing="All"
      />
      <SelectField
        {...of('construction')}
        label="Construction"
        options={{ single: 'Single cannula', dual: 'Dual cannula' }}
        nothing="All"
      />
      <SelectField {...of('order')} label="Sorted by" options={orders} />
    </>
  )
}

/** The address of another page of the same list. */
export function catalogueHref(ask: CatalogueFilterProps['ask'], page: number): string {
  const words = Object.entries({ ...ask, page: String(page) }).filter(([, word]) => word !== '')
  return `/catalogue?${new URLSearchParams(words)}`
}
