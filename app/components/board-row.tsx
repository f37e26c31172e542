import type { ReactNode } from 'react'
import { Link } from 'react-router'
import type { TaskStatus } from '#app/rules/status.ts'
import { DwellBar } from './dwell-bar.tsx'
import { edgeOf, toneOf } from './status-look.ts'
import { Tag } from './tag.tsx'

export interface NextCare {
  readonly name: string
  readonly title: string
  readonly status: TaskStatus
  /** `1 h 52 min late`, `due by 14:36`, `due 16:06` */
  readonly says: string
  /** Its form, for those who may chart it. */
  readonly href?: string
}

export interface BoardPatient {
  readonly href: string
  readonly bed: string
  readonly family: string
  readonly given: string
  readonly age: number
  readonly recordNo: string
  /** `8.0 ISO, cuffed, dual`; null when no tube is charted. */
  readonly tube: {
    readonly says: string
    readonly day: number
    readonly limit: number | null
    readonly status: TaskStatus
  } | null
  /** Most pressing first. */
  readonly next: readonly NextCare[]
  /** The most pressing status of all. */
  readonly worst: TaskStatus
  /** What runs, with how long it has: `Cap trial 3 h 5 min`. */
  readonly running?: readonly string[]
  /** Red and amber warnings that stand. */
  readonly warnings?: number
  /** Why nothing is computed. */
  readonly statement?: string | undefined
  /** One of them asks to act now. */
  readonly isUrgent?: boolean
  /** How many nobody has seen in time. */
  readonly unseen?: number
}

/** Shown at once: more would push the eighth patient off the screen. What else is late or due is counted below. */
const SHOWN = 2

/** Beds, people, tubes, strips and next care, in these columns on a desk and one below the other on a phone. */
const COLUMNS = 'md:grid-cols-[4rem_minmax(0,1fr)_minmax(0,1fr)] xl:grid-cols-[4rem_12rem_11.5rem_minmax(0,1fr)_20rem]'

interface BoardHeadProps {
  /** The axis of the strips. */
  readonly children: ReactNode
}

/** Column names and the axis, which is all that a narrow board keeps; a screen reader hears them in each row instead. */
export function BoardHead({ children }: BoardHeadProps) {
  return (
    <div
      aria-hidden="true"
      className={`items-end gap-x-5 border-b border-line px-4 py-2 pl-5 text-sm font-semibold text-ink3 xl:grid xl:px-5 ${COLUMNS}`}
    >
      <span className="max-xl:hidden">Bed</span>
      <span className="max-xl:hidden">Patient</span>
      <span className="max-xl:hidden">Tube</span>
      <div>{children}</div>
      <span className="max-xl:hidden">Next care</span>
    </div>
  )
}

export interface BoardRowProps {
  readonly patient: BoardPatient
  /** It has changed since the board was last drawn. */
  readonly changed?: boolean
  /** The hour strip. */
  readonly children: ReactNode
}

/** One patient on the board, as an item of a list. */
export function BoardRow({ patient, changed = false, children }: BoardRowProps) {
  const {
    href,
    bed,
    family,
    given,
    age,
    recordNo,
    tube,
    next,
    worst,
    running = [],
    warnings = 0,
    isUrgent = false,
    statement,
    unseen = 0,
  } = patient
  return (
    <li
      className={`relative grid grid-cols-[3.5rem_minmax(0,1fr)] items-center gap-x-4 gap-y-3 border-t border-hair px-4 py-3 pl-5 first:border-0 xl:gap-x-5 xl:px-5 xl:py-0.5 ${COLUMNS} ${edgeOf[worst]} ${changed ? 'row-fade' : ''}`}
    >
      <span className="text-2xl font-bold tracking-tight">
        <span className="sr-only">Bed </span>
        {bed}
      </span>
      <div className="min-w-0">
        <Link
          to={href}
          className="inline-flex min-h-11 max-w-full items-center text-lg leading-tight font-semibold [overflow-wrap:anywhere] hover:underline"
        >
          {`${family.toUpperCase()}, ${given}`}
        </Link>
        <p className="text-sm text-ink2">
          {age} y · {recordNo}
        </p>
        {running.map(words => (
          <p key={words}>
            <Tag tone="ok">{words}</Tag>
          </p>
        ))}
        {warnings > 0 && <Tag tone={isUrgent ? 'late' : 'due'}>{warningWords(warnings, unseen)}</Tag>}
      </div>
      <div className="min-w-0 max-md:col-start-2">
        <p className="text-sm font-semibold">{tube ? tube.says : 'No tube charted'}</p>
        {tube && <DwellBar day={tube.day} limit={tube.limit} status={tube.status} />}
      </div>
      <div className="min-w-0 max-xl:col-span-full">{children}</div>
      <NextCareList next={next} statement={statement} />
    </li>
  )
}

/** `2 warnings, 1 not seen yet` */
function warningWords(warnings: number, unseen: number): string {
  const words = warnings === 1 ? '1 warning' : `${warnings} warnings`
  if (unseen === 0) return words
  return `${words}, ${unseen === warnings ? '' : `${unseen} `}not seen yet`
}

interface NextCareListProps {
  readonly next: readonly NextCare[]
  readonly statement: string | undefined
}

const late: readonly TaskStatus[] = ['overdue', 'seriously overdue']

function NextCareList({ next, statement }: NextCareListProps) {
  const more = moreWords(next.slice(SHOWN))
  return (
    <ul aria-label="Next care" className="grid max-xl:col-span-full">
      {next.slice(0, SHOWN).map(care => (
        <NextCareItem key={care.name} care={care} />
      ))}
      {more !== '' && <li className="text-sm font-semibold text-due">{more}</li>}
      {next.length === 0 && <li className="text-ink2">{statement ?? 'Nothing due'}</li>}
    </ul>
  )
}

/** `and 12 more late, 1 due`; nothing when the rest can wait. */
function moreWords(rest: readonly NextCare[]): string {
  const lateOnes = rest.filter(({ status }) => late.includes(status)).length
  const due = rest.filter(({ status }) => status === 'due').length
  if (lateOnes === 0) return due === 0 ? '' : `and ${due} more due`
  return `and ${lateOnes} more late${due === 0 ? '' : `, ${due} due`}`
}

/** The whole line leads to the form: a thumb need not hit the words. */
function NextCareItem({ care: { title, status, says, href } }: { readonly care: NextCare }) {
  const line = 'flex min-h-11 flex-wrap items-center justify-between gap-x-3'
  const words = (
    <>
      <span className="min-w-0 font-semibold">{title}</span>
      <Tag tone={toneOf[status]}>{says}</Tag>
    </>
  )
  return (
    <li>
      {href ? (
        <Link to={href} className={`${line} rounded-control hover:underline`}>
          {words}
        </Link>
      ) : (
        <div className={line}>{words}</div>
      )}
    </li>
  )
}
