import { Link } from 'react-router'
import type { BedItem } from '#app/supplies/bed-stock.ts'
import type { ItemRow, Standing } from '#app/supplies/ward-stock.ts'
import { Card } from './card.tsx'
import { Table } from './table.tsx'
import { Tag, type TagTone } from './tag.tsx'

const tones: Readonly<Record<Standing, TagTone>> = {
  'below nothing': 'late',
  'order now': 'due',
  enough: 'ok',
  'not used': 'plain',
}

const LINK = 'inline-flex min-h-11 min-w-11 items-center underline underline-offset-3'

export interface StockTableProps {
  readonly items: readonly ItemRow[]
  /** The address of the ward's supplies. */
  readonly here: string
}

/** Every item of a ward with what there is and how long it lasts. */
export function StockTable({ items, here }: StockTableProps) {
  return (
    <Table
      caption="Stock"
      columns={[
        { label: 'Item and standing' },
        { label: 'Lasts' },
        { label: 'Store', numeric: true },
        { label: 'At beds', numeric: true },
        { label: 'Use a day', numeric: true },
        { label: 'Reorder at', numeric: true },
      ]}
      rows={items.map(row => ({
        key: row.item,
        cells: [
          <ItemStanding key="item" row={row} here={here} />,
          <span key="lasts">
            {sentence(row.lasts)}
            {row.basis !== '' && <span className="block min-w-32 text-sm text-ink2">{row.basis}</span>}
          </span>,
          <Pieces key="store" pieces={row.store} />,
          <Pieces key="beds" pieces={row.atBeds} />,
          row.perDay,
          row.reorderAt,
        ],
      }))}
    />
  )
}

interface ItemStandingProps {
  readonly row: ItemRow
  readonly here: string
}

/** What it is and how it stands, together: on a phone the columns after the second are beyond the edge. */
function ItemStanding({ row: { item, words, standing }, here }: ItemStandingProps) {
  return (
    <span className="flex min-w-36 flex-wrap items-center justify-between gap-x-6 gap-y-1">
      <Link to={`${here}/history?item=${item}`} className={`wrap-anywhere ${LINK}`}>
        {words}
      </Link>
      <Tag tone={tones[standing]}>{sentence(standing)}</Tag>
    </span>
  )
}

interface PiecesProps {
  readonly pieces: number
}

/** Below nothing: more was charted as used than came. */
function Pieces({ pieces }: PiecesProps) {
  return <span className={pieces < 0 ? 'font-semibold text-late' : ''}>{pieces}</span>
}

const sentence = (words: string): string => words.charAt(0).toUpperCase() + words.slice(1)

export interface OrderTableProps {
  readonly items: readonly ItemRow[]
  readonly days: number
}

/** What to order, in pieces and in boxes. */
export function OrderTable({ items, days }: OrderTableProps) {
  return (
    <Table
      caption="To order"
      columns={[
        { label: 'Item' },
        { label: 'Order', numeric: true },
        { label: 'Boxes', numeric: true },
        { label: 'Stock', numeric: true },
        { label: `Need for ${days} days`, numeric: true },
      ]}
      rows={items.map(({ item, words, order, boxes, packSize, stock, need }) => ({
        key: item,
        cells: [
          <span key="item" className="block min-w-44 wrap-anywhere">
            {words}
          </span>,
          order,
          <span key="boxes" className="whitespace-nowrap">
            {boxes === null ? '' : `${boxes} of ${packSize}`}
          </span>,
          <Pieces key="stock" pieces={stock} />,
          need,
        ],
      }))}
    />
  )
}

interface BedView {
  readonly id: string
  readonly label: string
  readonly patient: string | null
  readonly patientId: string | null
  readonly items: readonly BedItem[]
}

export interface BedStockProps {
  readonly beds: readonly BedView[]
  readonly here: string
}

/** What lies at each bed, and how long it lasts for the patient in it. */
export function BedStock({ beds, here }: BedStockProps) {
  return (
    <Card title="At the beds" flush>
      <ul>
        {beds.map(({ id, label, patient, patientId, items }) => (
          <li
            key={id}
            className="grid gap-x-6 gap-y-1 border-t border-hair px-4 py-2 md:grid-cols-[16rem_minmax(0,1fr)]"
          >
            <div className="min-w-0">
              <span className="font-semibold">Bed {label}</span>{' '}
              {patientId === null ? (
                <span className="text-ink2">nobody in it</span>
              ) : (
                <Link to={`/patients/${patientId}`} className={`wrap-anywhere ${LINK}`}>
                  {patient}
                </Link>
              )}
            </div>
            <BedItems items={items} moveHref={`${here}/move?to=${id}`} />
          </li>
        ))}
      </ul>
    </Card>
  )
}

interface BedItemsProps {
  readonly items: readonly BedItem[]
  /** Where something is moved to this bed. */
  readonly moveHref: string
}

function BedItems({ items, moveHref }: BedItemsProps) {
  if (items.length === 0) return <p className="self-center text-ink2">Nothing lies here</p>
  return (
    <ul className="grid gap-1 self-center">
      {items.map(({ item, words, stock, use, lasts, isLow }) => (
        <li key={item}>
          <span className={`font-semibold ${stock < 0 ? 'text-late' : ''}`}>{stock}</span> {words}, {lasts}
          {use !== '' && <span className="text-sm text-ink2"> ({use})</span>}
          {isLow && (
            <>
              {' '}
              <Tag tone={stock < 0 ? 'late' : 'due'}>{stock < 0 ? 'Below nothing' : 'Less than a day'}</Tag>{' '}
              <Link to={`${moveHref}&item=${item}`} className={LINK}>
                Move some here<span className="sr-only">: {words}</span>
              </Link>
            </>
          )}
        </li>
      ))}
    </ul>
  )
}
