import type { Rate } from '../clinical/supply.ts'
import { showDuration } from '../time/display.ts'
import { type Duration, hours } from '../time/duration.ts'
import type { WardRate } from './rates.ts'

/** A use a day to read: `2`, `0.5`, `0.04`; a decimal of ten or more says nothing. */
export function showRate(perDay: number): string {
  if (perDay === 0) return '0'
  const places = perDay >= 10 ? 0 : perDay >= 0.1 ? 1 : 2
  return String(Number(perDay.toFixed(places)))
}

/** `about 1 d 12 h`, cut to hours, and to days from ten on; a stock that nothing takes from lasts for no known time. */
export function lastingWords(time: Duration | null): string {
  if (time === null) return 'not used now'
  if (time < hours(1)) return 'nothing left'
  const days = Math.floor(time / hours(24))
  return `about ${days >= 10 ? `${days} d` : showDuration(Math.floor(time / hours(1)) * hours(1))}`
}

/** Where a patient's rate comes from: `14 days of data`, or why there is none. */
export function basisWords({ daysOfData, perDay }: Rate): string {
  if (daysOfData > 0) return `${daysOfData} days of data`
  return perDay > 0 ? 'too little data: by the interval in force' : 'too little data'
}

/** Where a ward's rate comes from. */
export function wardBasisWords({ counted, planned, fewestDays }: WardRate): string {
  const from = counted > 0 ? [`${patients(counted)} counted over at least ${fewestDays} days`] : []
  const by = planned > 0 ? [`${patients(planned)} by interval, too little data`] : []
  return [...from, ...by].join('; ')
}

const patients = (count: number): string => `${count} ${count === 1 ? 'patient' : 'patients'}`
