import type { CatalogueInnerCannula, CatalogueTube } from '#app/catalogue/item.ts'
import { type Catalogue, catalogueCells } from '#app/catalogue/known-items.ts'
import { checkDigit } from '#app/clinical/gs1-gtin.ts'
import { corvane, halden, type LineSeed, linnet, marrow, type TubeSeed } from './catalogue-lines.ts'
import { idAt, randomFrom } from './random.ts'

const ADDED_AT = new Date('2026-01-05T09:00:00Z')
const RETIRED_AT = new Date('2026-02-16T08:20:00Z')

const lines = [corvane, halden, linnet, marrow]

const idOf = (name: string): string => idAt(ADDED_AT, randomFrom(name))

/** A GTIN from the prefix that GS1 keeps for demonstrations: one digit for the line, two for the kind of item, six for which. */
function demoGtin(line: number, kind: 'tube' | 'inner cannula', item: number): string {
  const digits = `0952${line + 1}${kind === 'tube' ? '10' : '20'}${String(item + 1).padStart(6, '0')}`
  return `${digits}${checkDigit(digits)}`
}

const tubesOf = (seed: LineSeed, line: number): readonly CatalogueTube[] =>
  seed.tubes.map((tube, item) => {
    const { retired, ...rest } = tube
    return { ...itemOf(seed, `tube ${line} ${item}`, retired === true), gtin: demoGtin(line, 'tube', item), ...rest }
  })

const innerCannulasOf = (seed: LineSeed, line: number): readonly CatalogueInnerCannula[] =>
  seed.innerCannulas.map((cannula, item) => {
    return {
      ...itemOf(seed, `inner cannula ${line} ${item}`, false),
      gtin: demoGtin(line, 'inner cannula', item),
      ...cannula,
    }
  })

function itemOf({ line, maker }: LineSeed, name: string, retired: boolean) {
  const retiredAt = retired ? RETIRED_AT : null
  return { id: idOf(name), lineId: idOf(line), line, maker, retiredAt, version: retired ? 2 : 1 }
}

/** The catalogue of the demo hospital: four invented lines that hold every kind of tube. Ids and GTINs are always the same. */
export const demoCatalogue: Catalogue = {
  lines: lines.map(({ line, maker }) => ({ id: idOf(line), line, maker })),
  tubes: lines.flatMap(tubesOf),
  innerCannulas: lines.flatMap(innerCannulasOf),
  fits: lines.flatMap((seed, line) => {
    const cannulas = innerCannulasOf(seed, line)
    return tubesOf(seed, line).flatMap(tube =>
      cannulas
        .filter(cannula => seed.fits(tube, cannula))
        .map(cannula => ({ tubeId: tube.id, innerCannulaId: cannula.id })),
    )
  }),
}

/** A tube of the demo catalogue by what sets it apart. Throws when there is none, or more than one. */
export function demoTube(description: Partial<TubeSeed> & { readonly line: string }): CatalogueTube {
  const wanted = Object.entries(description)
  const found = demoCatalogue.tubes.filter(tube =>
    wanted.every(([name, value]) => tube[name as keyof CatalogueTube] === value),
  )
  const [tube] = found
  if (!tube || found.length > 1) throw new RangeError(`${JSON.stringify(description)} is ${found.length} tubes`)
  return tube
}

/** Who put what into the catalogue and took it out again, as stored. */
export function demoCatalogueChanges(catalogue: Catalogue, changedBy: string) {
  return catalogueCells(catalogue).flatMap(cells => {
    const { item, id } = cells
    const by = { subject: item, subject_id: id, changed_by: changedBy }
    const told = Object.entries({ ...cells, retired: 'no' }).filter(([, cell]) => cell !== '')
    const values = { old_values: null, new_values: JSON.stringify(Object.fromEntries(told)) }
    const added = { ...by, what: `${item} added`, changed_at: ADDED_AT, ...values }
    if (cells.retired === 'no') return [added]
    const no = JSON.stringify({ retired: 'no' })
    const yes = JSON.stringify({ retired: 'yes' })
    return [added, { ...by, what: `${item} retired`, changed_at: RETIRED_AT, old_values: no, new_values: yes }]
  })
}
