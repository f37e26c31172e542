import { showDateTime } from '../../time/display.ts'
import { decannulations } from '../decannulation/schema.ts'
import { innerCannulaActs } from '../inner-cannula/schema.ts'
import type { CareContext, Entry, PatientRecord } from '../kind.ts'
import { observationSets } from '../observations/schema.ts'
import { tubeChanges } from '../tube-change/schema.ts'
import { isBackIn } from '../tube-change/tube-absence.ts'
import type { Warning } from '../warning.ts'
import { isStillBleeding } from './bleed.ts'
import { outAgain, standingOutAgain } from './repeats.ts'
import { type AdverseEventData, adverseEvents, leavesTubeOut } from './schema.ts'
import { urgentWarnings } from './urgent.ts'

/** What an event asks people to notice: what to do now, or what to follow up once it is over. */
export function adverseEventWarnings(data: AdverseEventData, context: CareContext): readonly Warning[] {
  const urgent = urgentWarnings(data, context)
  return [
    ...urgent,
    ...outAgain(data, context),
    ...injury(data),
    ...untold(data),
    ...(urgent.length === 0 && data.event !== 'pressure injury' && data.outcome !== 'died' ? [followUp] : []),
  ]
}

function injury({ event }: AdverseEventData): readonly Warning[] {
  if (event !== 'pressure injury') return []
  return [
    {
      name: 'event-pressure-injury',
      level: 'amber',
      action: 'Refer to wound care or ENT today, and chart the stage under stoma and skin.',
      cause: 'A pressure injury from the tube or what holds it.',
      source: 'NPUAP (now NPIAP) 2016 stages; referral is a product proposal',
    },
  ]
}

function untold({ told }: AdverseEventData): readonly Warning[] {
  if (!told.includes('nobody')) return []
  return [
    {
      name: 'event-nobody-told',
      level: 'amber',
      action: 'Tell the charge nurse now.',
      cause: 'Nobody has been told of the event yet.',
      source: 'Common practice',
    },
  ]
}

const followUp: Warning = {
  name: 'event-follow-up',
  level: 'blue',
  action: 'Look for the cause, tell the tracheostomy team today, and report it as your hospital asks.',
  cause: 'An event that was put right can come again.',
  source: 'Common practice',
}

/**
 * The latest event of each sort stands while it asks for something now: a tube that is out until one is in or taken out for good,
 * a bleed until a later look found no blood, a wrong cannula until another went in, anything else until the patient breathed easily or it was charted as over.
 */
export function standingAdverseEventWarnings(context: CareContext): readonly Warning[] {
  const { record, ward } = context
  const all = record.of(adverseEvents)
  const latest = all.filter(entry => all.find(({ data }) => data.event === entry.data.event) === entry)
  const stands = latest
    .filter(entry => isOpen(entry, record))
    .flatMap(({ data, performedAt }) => {
      const when = showDateTime(performedAt, ward.zone)
      return urgentWarnings(data, { ...context, now: performedAt }).map(warning => {
        return { ...warning, cause: `${warning.cause} Charted ${when}.` }
      })
    })
  return [...stands, ...standingOutAgain(context)]
}

function isOpen(entry: Entry<AdverseEventData>, record: PatientRecord): boolean {
  const { data, performedAt: at } = entry
  if (leavesTubeOut(data)) return !isTubeSettled(entry, record)
  if (data.event === 'bleeding') return isStillBleeding(entry, record)
  if (data.event === 'wrong cannula' && data.outcome !== 'not settled') return !isRefitted(at, record)
  return !record
    .since(observationSets, at)
    .some(({ data: { effort }, performedAt }) => performedAt > at && effort === 'easy')
}

/** A tube went in, was charted as back, or was given up for good. */
function isTubeSettled(out: Entry<AdverseEventData>, record: PatientRecord): boolean {
  const { performedAt: at } = out
  return isBackIn(out, record) || record.since(decannulations, at).some(({ performedAt }) => performedAt > at)
}

/** Another inner cannula went in, by itself or with another tube. */
function isRefitted(at: Date, record: PatientRecord): boolean {
  return (
    record.since(innerCannulaActs, at).some(({ data, performedAt }) => performedAt > at && data.act !== 'unable') ||
    record.since(tubeChanges, at).some(({ data, performedAt }) => performedAt > at && data.difficulty !== 'failed')
  )
}
