import type { Catalogue } from '#app/catalogue/known-items.ts'
import { checkDigit } from '#app/clinical/gs1-gtin.ts'
import { demoCatalogue } from '#database/seeders/catalogue.ts'
import { idAt, randomFrom } from '#database/seeders/random.ts'

const TUBES = 2000
const INNER_CANNULAS = 500
const ADDED_AT = new Date('2026-01-05T09:00:00Z')

/** A catalogue of 2,000 tubes and 500 inner cannulas: the demo's own, and its lines again and again under other names. */
export function largeCatalogue(): Catalogue {
  const copies = Array.from({ length: Math.ceil(TUBES / demoCatalogue.tubes.length) }, (_, copy) => copy)
  const tubes = copies.flatMap(copy => demoCatalogue.tubes.map(tube => copied(tube, copy))).slice(0, TUBES)
  const innerCannulas = copies
    .flatMap(copy => demoCatalogue.innerCannulas.map(cannula => copied(cannula, copy)))
    .slice(0, INNER_CANNULAS)
  const known = new Set([...tubes, ...innerCannulas].map(({ id }) => id))
  const fits = copies.flatMap(copy =>
    demoCatalogue.fits.map(fit => ({ tubeId: idOf(fit.tubeId, copy), innerCannulaId: idOf(fit.innerCannulaId, copy) })),
  )
  return {
    lines: copies.flatMap(copy =>
      demoCatalogue.lines.map(line => ({ ...line, ...nameOf(line, copy), id: idOf(line.id, copy) })),
    ),
    tubes: tubes.map(numbered(1)),
    innerCannulas: innerCannulas.map(numbered(2)),
    fits: fits.filter(fit => known.has(fit.tubeId) && known.has(fit.innerCannulaId)),
  }
}

interface Item {
  readonly id: string
  readonly lineId: string
  readonly line: string
  readonly maker: string
  readonly gtin: string | null
}

function copied<Of extends Item>(item: Of, copy: number): Of {
  return { ...item, ...nameOf(item, copy), id: idOf(item.id, copy), lineId: idOf(item.lineId, copy) }
}

const nameOf = ({ line, maker }: Pick<Item, 'line' | 'maker'>, copy: number) =>
  copy === 0 ? { line, maker } : { line: `${line} ${copy}`, maker: `${maker} ${copy}` }

const idOf = (id: string, copy: number): string => (copy === 0 ? id : idAt(ADDED_AT, randomFrom(`${id} ${copy}`)))

/** A GTIN of its own for each item of a kind, of the prefix that is kept for demonstrations. */
const numbered =
  (kind: number) =>
  <Of extends Item>(item: Of, at: number): Of => {
    const digits = `0952${kind}${String(at).padStart(8, '0')}`
    return { ...item, gtin: `${digits}${checkDigit(digits)}` }
  }
