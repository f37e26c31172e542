import { Link } from 'react-router'
import type { PatientItem } from '#app/supplies/patient-stock.ts'
import { LinkButton } from './button.tsx'
import { Card } from './card.tsx'

export interface BedSuppliesProps {
  readonly bed: string
  readonly bedId: string
  readonly items: readonly PatientItem[]
  /** Where the ward's supplies are kept; null for whoever does not keep them. */
  readonly wardHref: string | null
}

/** What lies at the bed of one patient, how long it lasts, and what is to be done about it. */
export function BedSupplies({ bed, bedId, items, wardHref }: BedSuppliesProps) {
  return (
    <Card title={`Supplies at bed ${bed}`}>
      {items.length === 0 ? (
        <p className="text-ink2">Nothing is kept at this bed. What is used is taken from the ward’s store.</p>
      ) : (
        <ul className="grid gap-3">
          {items.map(item => (
            <Item
              key={item.item}
              item={item}
              moveHref={wardHref === null ? null : `${wardHref}/move?from=store&to=${bedId}&item=${item.item}`}
            />
          ))}
        </ul>
      )}
      {wardHref !== null && (
        <div className="mt-4">
          <LinkButton href={wardHref}>Supplies of the ward</LinkButton>
        </div>
      )}
    </Card>
  )
}

interface ItemProps {
  readonly item: PatientItem
  readonly moveHref: string | null
}

function Item({ item: { words, stock, lasts, use, store, notice, isLow }, moveHref }: ItemProps) {
  return (
    <li className="border-t border-hair pt-3 first:border-0 first:pt-0">
      <div className="flex gap-3">
        <span className={`min-w-8 shrink-0 text-right text-lg leading-6 font-semibold ${stock < 0 ? 'text-late' : ''}`}>
          {stock}
        </span>
        <div className="min-w-0 wrap-anywhere">
          <p className="font-semibold">{words}</p>
          <p className="text-sm text-ink2">{[lasts, use, `${store} in the store`].filter(Boolean).join(' · ')}</p>
          {notice !== null && (
            <p className={`mt-1 text-sm font-semibold ${stock < 0 ? 'text-late' : 'text-due'}`}>{notice}</p>
          )}
          {moveHref !== null && isLow && store > 0 && (
            <Link to={moveHref} className="inline-flex min-h-11 items-center underline underline-offset-3">
              Move some here<span className="sr-only">: {words}</span>
            </Link>
          )}
        </div>
      </div>
    </li>
  )
}
