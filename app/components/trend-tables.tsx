import { Link } from 'react-router'
import type { DayOfLooks, FindingsView } from '#app/rules/trend-findings.ts'
import type { LengthsView } from '#app/rules/trend-lengths.ts'
import type { MeasureView } from '#app/rules/trend-measures.ts'
import { momentWords } from '#app/rules/words.ts'
import { showDay, showDuration } from '#app/time/display.ts'
import type { Zone } from '#app/time/zone.ts'
import { Table } from './table.tsx'

interface TableOf<View> {
  readonly view: View
  /** The server's clock (ms). */
  readonly now: number
  readonly zone: Zone
}

/** Every reading, latest first, with its entry. */
export function MeasureTable({ view, now, zone }: TableOf<MeasureView>) {
  return (
    <Table
      caption={`Values of ${view.title}`}
      isTall
      columns={[{ label: 'When' }, ...view.marks.map(({ label }) => ({ label, numeric: true })), { label: 'Remark' }]}
      rows={view.readings.toReversed().map(({ at, entryId, values, remark }) => ({
        key: entryId,
        cells: [
          <EntryLink key="when" entryId={entryId} words={momentWords(at, now, zone)} />,
          ...view.marks.map(({ name }) => {
            const value = values.find(({ mark }) => mark === name)
            return (
              <span key={name} className={`whitespace-nowrap ${value?.isOut ? 'font-bold text-late' : ''}`}>
                {value?.words ?? ''}
              </span>
            )
          }),
          <span key="remark" className="text-sm">
            {remark}
          </span>,
        ],
      }))}
    />
  )
}

/** Every day, latest first, with its looks. */
export function FindingsTable({ view }: TableOf<FindingsView>) {
  return (
    <Table
      caption={`Days of ${view.title}`}
      isTall
      columns={[{ label: 'Day' }, { label: 'Looks' }, { label: 'Found' }]}
      rows={view.days.toReversed().map(day => ({
        key: day.day,
        cells: [
          <span key="day" className="whitespace-nowrap">
            {showDay(day.day)}
          </span>,
          <span key="looks" className="inline-flex flex-wrap gap-x-3">
            {day.looks.map(({ entryId, time }) => (
              <EntryLink key={entryId} entryId={entryId} words={time} />
            ))}
          </span>,
          foundWords(day),
        ],
      }))}
    />
  )
}

function foundWords({ looks, found }: DayOfLooks): string {
  if (looks.length === 0) return 'Nobody looked'
  return found.length === 0 ? 'Nothing found' : `${found.join('. ')}.`
}

/** Everything that lasted, by sort and latest first. */
export function LengthsTable({ view, now, zone }: TableOf<LengthsView>) {
  return (
    <Table
      caption={`Lengths of ${view.title}`}
      isTall
      columns={[{ label: 'Begun' }, { label: 'What' }, { label: 'Length', numeric: true }, { label: 'How it ended' }]}
      rows={view.groups.flatMap(({ label, lengths }) =>
        lengths.map(({ entryId, startedAt, length, target, verdict, because }) => ({
          key: entryId,
          cells: [
            <EntryLink key="when" entryId={entryId} words={momentWords(startedAt, now, zone)} />,
            label,
            <span key="length" className="whitespace-nowrap">
              {showDuration(length)}
              {target !== null && <span className="block text-sm text-ink2">of {showDuration(target)}</span>}
            </span>,
            <span key="end">
              <b className="font-semibold">{verdict}.</b> {because}
            </span>,
          ],
        })),
      )}
    />
  )
}

interface EntryLinkProps {
  readonly entryId: string
  readonly words: string
}

/** The entry behind a value. */
export function EntryLink({ entryId, words }: EntryLinkProps) {
  return (
    <Link
      to={`/entries/${entryId}`}
      className="inline-flex min-h-11 min-w-11 items-center underline underline-offset-3"
    >
      {words}
    </Link>
  )
}
