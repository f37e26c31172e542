import { laryngoscopyGrades } from '../care/bed-head-sign/schema.ts'
import { depthPastTip } from '../care/bed-head-sign/settings.ts'
import { spareWords } from '../care/bedside-kit/spares.ts'
import type { EmergencyNumber } from '../care/emergency.ts'
import { EMERGENCY_SOURCE, type EmergencyStep, emergencySteps, type TubeFacts } from '../care/emergency-steps.ts'
import type { CareContext, PatientFacts } from '../care/kind.ts'
import { catheterRule } from '../care/suction/catheter.ts'
import { tubeChanges } from '../care/tube-change/schema.ts'
import { suturesIn } from '../care/tube-change/tasks.ts'
import { dwellLimit, insertedOn, type TubeEntry, tubeInPlace, workingIdMm } from '../care/tube-change/tube.ts'
import { largestCatheter } from '../clinical/suction-catheter.ts'
import { showDateTime, showDay } from '../time/display.ts'
import type { LocalDay } from '../time/zone.ts'
import { type TubeCard, tubeCard } from './tube-card.ts'

/** Whose sign it is, and where it hangs. */
export interface SignPerson {
  readonly bed: string
  readonly ward: string
  readonly familyName: string
  readonly givenName: string
  readonly bornOn: LocalDay
  readonly recordNumber: string
  readonly allergies: string | null
}

/** A bed-head sign as it is printed, every word of it. Page and PDF draw the same. */
export interface BedHeadSign {
  readonly bed: string
  readonly name: string
  readonly identity: string
  readonly title: string
  readonly where: string
  /** `Upper airway` with `OPEN`, and where oxygen goes. */
  readonly airway: { readonly label: string; readonly says: string; readonly oxygen: string }
  readonly plate: TubeCard['plate'] | null
  readonly facts: readonly { readonly label: string; readonly value: string }[]
  readonly stepsTitle: string
  readonly steps: readonly EmergencyStep[]
  readonly cautions: readonly string[]
  readonly numbersTitle: string
  readonly numbers: readonly EmergencyNumber[]
  readonly ends: string
  readonly aid: string
}

/** What a sign needs beside the record: whom the ward calls, what of the tube changes a step, and when it is printed. */
export interface SignSetting {
  readonly numbers: readonly EmergencyNumber[]
  readonly facts: TubeFacts
  readonly printedAt: Date
}

const airways: Readonly<Record<PatientFacts['upperAirway'], BedHeadSign['airway'] & { readonly title: string }>> = {
  open: {
    title: 'Tracheostomy',
    label: 'Upper airway',
    says: 'OPEN',
    oxygen: 'Give oxygen to the face and the neck. Intubation by the mouth may be difficult.',
  },
  'not open': {
    title: 'Laryngectomy',
    label: 'No airway through mouth or nose',
    says: 'NECK BREATHER',
    oxygen: 'Give oxygen to the neck. The lungs cannot be reached through the mouth: no oxygen, no tube that way.',
  },
  'not known': {
    title: 'Neck stoma',
    label: 'Upper airway',
    says: 'NOT KNOWN',
    oxygen: 'Give oxygen to the face and the neck until it is settled whether the mouth connects to the lungs.',
  },
}

/** The sign of one patient as of `context.now`, stamped `printedAt`: one of two forms by the upper airway or, while that is not known, the safe one. */
export function bedHeadSign(
  context: CareContext,
  person: SignPerson,
  { numbers, facts, printedAt }: SignSetting,
): BedHeadSign {
  const { record, ward } = context
  const tube = tubeInPlace(record)
  const card = tubeCard(context)
  const { title, ...airway } = airways[record.patient.upperAirway]
  const { steps, cautions } = emergencySteps(record.patient.upperAirway, facts)
  return {
    bed: person.bed,
    name: `${person.familyName.toUpperCase()}, ${person.givenName}`,
    identity: `born ${showDay(person.bornOn)} · record no. ${person.recordNumber}`,
    title,
    where: `${person.ward} · printed ${showDateTime(printedAt, ward.zone)}`,
    airway,
    plate: 'none' in card ? null : card.plate,
    facts: [...(tube ? tubeFacts(tube, context) : noTube), ...problemFacts(record.patient, person)],
    stepsTitle: 'If breathing is difficult',
    steps,
    cautions,
    numbersTitle: 'Call',
    numbers: numbers.length > 0 ? numbers : [{ who: 'Airway team', number: 'by your local number' }],
    ends: tube ? 'This sign ends with the next tube change.' : 'This sign ends when a tube is put in.',
    aid: `An aid for trained staff. Follow the hospital’s own airway emergency plan where it differs. ${EMERGENCY_SOURCE}.`,
  }
}

const noTube = [{ label: 'Tube', value: 'None in place' }]

function tubeFacts(tube: TubeEntry, context: CareContext) {
  const { data } = tube
  const { values } = context
  const limit = dwellLimit(tube, context)
  const fr = largestCatheter(workingIdMm(data), catheterRule(values))
  const depthCm = ((data.lengthMm + values.of(depthPastTip)) / 10).toFixed(1)
  return [
    { label: 'Tube', value: `${data.line}, ${data.size} ${data.sizeSystem}, ${cuffs[data.cuff]}` },
    { label: 'Inner cannula', value: inner(data) },
    { label: '15 mm connector', value: connectors[data.connector] },
    {
      label: 'Suction',
      value: `${fr === undefined ? 'No catheter in stock fits' : `${fr} Fr at most`}, ${depthCm} cm deep`,
    },
    { label: 'Inserted', value: showDay(insertedOn(tube, context)) },
    { label: 'Change by', value: showDay(limit.changeBy) },
    ...madeBy(context),
    { label: 'Flange sutures', value: suturesIn(context) ? 'In place' : 'None' },
    { label: 'Spares at this bed', value: spareWords(context) ?? 'None' },
  ]
}

const cuffs = { none: 'no cuff', air: 'air cuff', water: 'water cuff', foam: 'foam cuff' } as const
const connectors = {
  outer: 'On the outer tube',
  inner: 'On the inner cannula: needed for the bag',
  none: 'None',
} as const

function inner({ construction, innerCannula }: TubeEntry['data']): string {
  if (construction === 'single') return 'None: single cannula'
  const kind = innerCannula === 'none' ? 'None in place' : innerCannula
  return kind === undefined ? 'Not known' : kind.charAt(0).toUpperCase() + kind.slice(1)
}

function madeBy({ record }: CareContext) {
  const made = record.latest(tubeChanges, data => data.technique !== undefined)?.data.technique
  const technique =
    made === undefined || made === 'not known' ? 'Not known' : made.charAt(0).toUpperCase() + made.slice(1)
  return [{ label: 'Opening made by', value: technique }]
}

function problemFacts({ laryngoscopy, airwayNotes }: PatientFacts, { allergies }: SignPerson) {
  return [
    ...(laryngoscopy ? [{ label: 'View at laryngoscopy', value: laryngoscopyGrades[laryngoscopy] }] : []),
    ...(airwayNotes ? [{ label: 'Known problems', value: airwayNotes }] : []),
    { label: 'Allergies', value: allergies ?? 'Not asked yet' },
  ]
}
