import { numberSetting, type Setting, type Source } from './policy.ts'
import { atMost, below, type PolicyCheck } from './policy-check.ts'

/** No tracheostomy guideline gives a grace time: the tolerances are those that ISMP 2011 gives for medicines, adopted as a proposal. */
const adopted = (share: string): Source => ({
  says: `No guideline for tracheostomy care gives one; adopted from ISMP 2011, timely administration of scheduled medicines: ${share}`,
  standing: 'product proposal',
})
const ownNumber: Source = { says: 'No published number', standing: 'product proposal' }

const SHORT = 'Care due more often than every 4 h'
const MIDDLE = 'Care due every 4 h or less often, but within a day'
const LONG = 'Care due every 24 h or less often'

const about = {
  tolerance: {
    words: 'in time when early or late by no more than',
    affects: 'Due care: when it is due and when it is overdue.',
  },
  soon: { words: 'due soon before its time by', affects: 'Due care: from when it is shown as due soon.' },
  serious: {
    words: 'seriously overdue when later than its time by',
    affects: 'Due care: when it is seriously overdue, and its place on the board.',
  },
} as const

interface Numbers {
  readonly unit: string
  readonly default: number
  readonly min: number
  readonly max: number
  readonly source: Source
}

function lateness(name: string, whose: string, part: keyof typeof about, numbers: Numbers): Setting<number> {
  const { words, affects } = about[part]
  return numberSetting({ name: `lateness-${name}-${part}`, label: `${whose}: ${words}`, affects, ...numbers })
}

const percent = '% of the interval'
const quarter = adopted('a quarter of an interval below 4 h')
const hour = adopted('60 min for what is given every 4 h or longer, but more often than daily')
const twoHours = adopted('120 min for what is given daily, weekly or monthly')

/** The numbers of each class of intervals. */
export const latenessOf = {
  short: {
    tolerance: lateness('short', SHORT, 'tolerance', { unit: percent, default: 25, min: 5, max: 50, source: quarter }),
    soon: lateness('short', SHORT, 'soon', { unit: percent, default: 25, min: 5, max: 100, source: quarter }),
    serious: lateness('short', SHORT, 'serious', { unit: percent, default: 100, min: 50, max: 300, source: ownNumber }),
  },
  middle: {
    tolerance: lateness('middle', MIDDLE, 'tolerance', { unit: 'min', default: 60, min: 15, max: 120, source: hour }),
    soon: lateness('middle', MIDDLE, 'soon', { unit: 'min', default: 60, min: 15, max: 240, source: hour }),
    serious: lateness('middle', MIDDLE, 'serious', {
      ...{ unit: 'min', default: 240, min: 60, max: 720 },
      source: { says: 'No published number; never more than the interval itself', standing: 'product proposal' },
    }),
  },
  long: {
    tolerance: lateness('long', LONG, 'tolerance', { unit: 'h', default: 2, min: 0.5, max: 6, source: twoHours }),
    soon: lateness('long', LONG, 'soon', { unit: 'h', default: 4, min: 0.5, max: 12, source: ownNumber }),
    serious: lateness('long', LONG, 'serious', { unit: 'h', default: 12, min: 4, max: 48, source: ownNumber }),
  },
} as const

export const eventSerious = numberSetting({
  name: 'lateness-event-serious',
  label: 'Care asked for by an event, such as a recheck: seriously overdue when later than its time by',
  unit: 'min',
  default: 60,
  min: 15,
  max: 240,
  affects: about.serious.affects,
  source: ownNumber,
})

export const daySerious = numberSetting({
  name: 'lateness-day-serious',
  label: 'Care due by date, such as a tube change: seriously overdue when later than its day by more than',
  unit: 'days',
  default: 1,
  min: 0,
  max: 7,
  affects: about.serious.affects,
  source: ownNumber,
})

const classes = Object.values(latenessOf)

/** What counts as due soon, in time and late, of every kind of care alike. */
export const toleranceSettings: readonly Setting<number>[] = [
  ...classes.flatMap(({ tolerance, soon, serious }) => [tolerance, soon, serious]),
  eventSerious,
  daySerious,
]

export const toleranceChecks: readonly PolicyCheck[] = classes.flatMap(({ tolerance, soon, serious }) => [
  atMost(tolerance, soon),
  below(tolerance, serious),
])
