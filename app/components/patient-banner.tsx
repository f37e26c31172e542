import type { ReactNode } from 'react'

export interface PatientBannerView {
  readonly bed: string
  readonly family: string
  readonly given: string
  /** `Male`, `Female`, or as recorded. */
  readonly sex: string
  /** `14-Mar-1962` */
  readonly born: string
  readonly age: number
  readonly recordNo: string
  readonly allergies: string
  readonly upperAirway: string
  readonly stomaMade: string
  readonly oxygen: string
  /** `94 to 98 %`, or that none is prescribed. */
  readonly spo2Target: string
  /** The larynx is gone: the face is no airway. */
  readonly laryngectomy: boolean
}

export interface PatientBannerProps {
  readonly patient: PatientBannerView
  /** The name is the title of the page; otherwise the content brings its own. */
  readonly isTitle?: boolean
  /** What was entered to open a patient of another ward, and the like. */
  readonly children?: ReactNode
  /** Emergency steps, bed-head sign. */
  readonly actions?: ReactNode
}

/** Whose chart this is: bed, name, birth and number first, then what everybody must know. Never shortened. */
export function PatientBanner({ patient, isTitle = false, actions, children }: PatientBannerProps) {
  const Name = isTitle ? 'h1' : 'p'
  const { bed, family, given, sex, born, age, recordNo, allergies, laryngectomy } = patient
  return (
    <section
      aria-label="Patient"
      className="group-has-[[data-sheet]]/page:print:hidden border-b border-line bg-surface px-4 py-3 md:px-6"
    >
      {laryngectomy && <LaryngectomyMark />}
      <div className="flex flex-wrap items-center gap-x-6 gap-y-3">
        <div className="flex items-center gap-4">
          <span className="text-3xl font-bold tracking-tight">
            <span className="sr-only">Bed </span>
            {bed}
          </span>
          <div>
            <Name className="text-xl leading-tight font-bold">{`${family.toUpperCase()}, ${given}`}</Name>
            <Fact label="Sex" value={sex} /> <Fact label="Born" value={`${born} (${age} y)`} />{' '}
            <Fact label="Record no." value={recordNo} />
          </div>
        </div>
        <dl className="flex flex-wrap gap-x-6 gap-y-2">
          <Item label="Allergies" value={allergies} />
          {!laryngectomy && <Item label="Upper airway" value={patient.upperAirway} />}
          <Item label="Stoma made" value={patient.stomaMade} />
          <Item label="Oxygen" value={patient.oxygen} />
          <Item label="SpO2 target" value={patient.spo2Target} />
        </dl>
        {actions && <div className="ml-auto flex flex-wrap gap-2">{actions}</div>}
      </div>
      {children}
    </section>
  )
}

/** Said in words and in black and white, since it decides where oxygen goes. */
function LaryngectomyMark() {
  return (
    <p className="mb-3 rounded-control border-2 border-ink bg-ink px-3 py-1.5 text-lg font-bold text-paper">
      Laryngectomy: breathes only through the neck. Oxygen to the neck, not the face.
    </p>
  )
}

interface FactProps {
  readonly label: string
  readonly value: string
}

function Fact({ label, value }: FactProps) {
  return (
    <span className="mr-3 inline-block text-sm">
      <span className="text-ink3">{label}</span> <b className="font-semibold">{value}</b>
    </span>
  )
}

function Item({ label, value }: FactProps) {
  return (
    <div>
      <dt className="text-sm leading-tight text-ink3">{label}</dt>
      <dd className="font-semibold">{value}</dd>
    </div>
  )
}
