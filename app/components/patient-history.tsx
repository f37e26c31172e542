import { Card } from './card.tsx'
import { Table } from './table.tsx'

export interface PatientHistoryProps {
  readonly beds: readonly { readonly key: string; readonly since: string; readonly bed: string; readonly by: string }[]
  readonly stays: readonly {
    readonly key: string
    readonly admitted: string
    readonly discharged: string
    readonly ward: string
    readonly destination: string
  }[]
  readonly changes: readonly {
    readonly key: string
    readonly when: string
    readonly who: string
    readonly what: string
    readonly details: readonly string[]
  }[]
}

/** Beds, stays and changes of details: what happened to a patient besides their care. */
export function PatientHistory({ beds, stays, changes }: PatientHistoryProps) {
  return (
    <>
      <Card title="Beds in this stay" flush>
        <Table
          caption="Beds in this stay"
          columns={[{ label: 'Since' }, { label: 'Bed' }, { label: 'Noted by' }]}
          rows={beds.map(({ key, since, bed, by }) => ({ key, cells: [since, bed, by] }))}
        />
      </Card>
      <Card title="Stays" flush>
        <Table
          caption="Stays"
          columns={[{ label: 'Admitted' }, { label: 'Discharged' }, { label: 'Ward' }, { label: 'Destination' }]}
          rows={stays.map(({ key, admitted, discharged, ward, destination }) => ({
            key,
            cells: [admitted, discharged, ward, destination],
          }))}
        />
      </Card>
      <Card title="What was changed" flush>
        <Table
          caption="What was changed"
          columns={[{ label: 'When' }, { label: 'Who' }, { label: 'What' }]}
          rows={changes.map(({ key, when, who, what, details }) => ({
            key,
            cells: [when, who, [what, ...details].join('. ')],
          }))}
        />
      </Card>
    </>
  )
}
