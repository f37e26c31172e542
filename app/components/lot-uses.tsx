import { Link } from 'react-router'
import { Card } from './card.tsx'
import { Empty } from './empty.tsx'
import { Table } from './table.tsx'

interface LotUsesProps {
  readonly trace: {
    readonly lot: string
    readonly uses: readonly {
      readonly entryId: string
      readonly patientId: string
      readonly name: string
      readonly recordNumber: string
      readonly where: string
      readonly what: string
      readonly device: string
      readonly at: string
    }[]
    readonly elsewhere: readonly { readonly wardId: string; readonly wardName: string; readonly patients: number }[]
    readonly isWhole: boolean
  }
}

const COLUMNS = ['Patient', 'Record no.', 'Where', 'Charted', 'Device', 'When']
const LINK = 'inline-flex min-h-11 items-center underline underline-offset-3'

/** The patients of one's own wards who had a lot, and how many there are on others. */
export function LotUses({ trace: { lot, uses, elsewhere, isWhole } }: LotUsesProps) {
  const patients = new Set(uses.map(({ patientId }) => patientId)).size
  return (
    <Card flush>
      {uses.length === 0 ? (
        <Empty title={`No patient of your wards had lot ${lot}`}>
          Only what was charted with its lot can be found.
        </Empty>
      ) : (
        <Table
          caption={`Lot ${lot}: ${patients} ${patients === 1 ? 'patient' : 'patients'}`}
          captionShown
          columns={COLUMNS.map(label => ({ label }))}
          rows={uses.map(use => ({
            key: use.entryId,
            cells: [
              <Link key="patient" to={`/patients/${use.patientId}`} className={LINK}>
                {use.name}
              </Link>,
              use.recordNumber,
              use.where,
              <Link key="entry" to={`/entries/${use.entryId}`} className={LINK}>
                {use.what}
              </Link>,
              use.device,
              <span key="at" className="whitespace-nowrap">
                {use.at}
              </span>,
            ],
          }))}
        />
      )}
      {!isWhole && <p className="p-4 font-semibold">There are more than these. Ask for a list from the database.</p>}
      {elsewhere.length > 0 && (
        <div className="border-t border-hair p-4">
          <p className="font-semibold">Patients of other wards had it too. Tell their charge nurses.</p>
          <ul>
            {elsewhere.map(({ wardId, wardName, patients: count }) => (
              <li key={wardId}>{`${wardName}: ${count}`}</li>
            ))}
          </ul>
        </div>
      )}
    </Card>
  )
}

interface RecalledLotsProps {
  readonly recalled: readonly { readonly lot: string; readonly says: string }[]
}

/** Every lot that is not to be used now; each leads to the patients who had it. */
export function RecalledLots({ recalled }: RecalledLotsProps) {
  return (
    <Card title="Recalled now">
      {recalled.length === 0 && <p className="text-ink2">No lot is recalled.</p>}
      <ul>
        {recalled.map(({ lot, says }) => (
          <li key={says} className="break-words">
            <Link to={`/lots?${new URLSearchParams({ lot })}`} className={LINK}>
              {says}
            </Link>
          </li>
        ))}
      </ul>
    </Card>
  )
}
