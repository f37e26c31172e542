import { jacksonDual, jacksonMetal } from '#app/clinical/sizes.ts'
import { Card } from './card.tsx'
import { Table } from './table.tsx'

const numeric = (label: string) => ({ label, numeric: true })

/** Both tables of Jackson sizes that are in print or in use. They contradict each other, and that is what they are shown for. */
export function JacksonTables() {
  return (
    <Card title="Two tables of Jackson sizes, which contradict each other" flush>
      <p className="max-w-3xl px-4 pb-3">
        A Jackson size is a plain number, not millimetres. By one table a Jackson 6 is 10.8 mm wide outside, by the
        other 10.0 mm; a Jackson 4 is 9.4 mm or 8.0 mm. So neither tells what a tube measures: read its flange and
        label.
      </p>
      <div className="grid gap-4 lg:grid-cols-2">
        <div>
          <Table
            caption="Dual-cannula style (university intensive care course)"
            captionShown
            columns={[
              numeric('Jackson'),
              numeric('ID with inner mm'),
              numeric('ID outer mm'),
              numeric('OD mm'),
              { label: 'Origin' },
            ]}
            rows={jacksonDual.map(row => ({
              key: String(row.jackson),
              cells: [
                row.jackson,
                row.idWithInnerMm.toFixed(1),
                row.idWithoutInnerMm.toFixed(1),
                row.odMm.toFixed(1),
                row.remark ?? 'Published',
              ],
            }))}
          />
        </div>
        <div>
          <Table
            caption="Traditional metal tubes (from memory, about)"
            captionShown
            columns={[numeric('Jackson'), numeric('OD mm'), numeric('Fr')]}
            rows={jacksonMetal.map(row => ({ key: row.jackson, cells: [row.jackson, row.odMm.toFixed(1), row.fr] }))}
          />
        </div>
      </div>
    </Card>
  )
}
