import { Card } from './card.tsx'
import { Table } from './table.tsx'

interface ItemHistoryProps {
  readonly history: readonly {
    readonly key: string
    readonly when: string
    readonly who: string
    readonly what: string
  }[]
}

/** Who changed what of the catalogue, newest first. */
export function ItemHistory({ history }: ItemHistoryProps) {
  return (
    <Card title="History" flush>
      {history.length === 0 ? (
        <p className="px-4 pb-4">Nothing was changed yet.</p>
      ) : (
        <Table
          caption="History"
          columns={[{ label: 'When' }, { label: 'Who' }, { label: 'What' }]}
          rows={history.map(({ key, when, who, what }) => ({ key, cells: [when, who, what] }))}
        />
      )}
    </Card>
  )
}
