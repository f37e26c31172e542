import type { BedHeadSign } from '#app/rules/bed-head-sign.ts'
import { Flange } from './flange.tsx'

export interface SignSheetProps {
  readonly sign: BedHeadSign
  /** The QR symbol that leads to the patient's page. */
  readonly qr: { readonly size: number; readonly path: string }
}

/** The bed-head sign as it will hang there: black on white by day and by night, one sheet of A4 on its long side. */
export function SignSheet({ sign, qr }: SignSheetProps) {
  return (
    <article
      data-sheet
      data-theme="day"
      aria-label="Bed-head sign"
      className="rounded-card border border-line bg-surface p-5 text-ink print:[page:sign] print:rounded-none print:border-0 print:p-0 print:text-[10.5pt] print:leading-tight"
    >
      <Head sign={sign} />
      <div className="grid grid-cols-[minmax(0,1fr)] gap-x-8 gap-y-5 pt-4 md:grid-cols-[4fr_5fr] print:grid-cols-[4fr_5fr] print:gap-y-2 print:pt-3">
        <div className="grid content-start gap-4 print:gap-2">
          <Airway airway={sign.airway} />
          {sign.plate && <Flange {...sign.plate} className="max-w-72 print:max-w-60" />}
          <dl className="grid grid-cols-2 gap-x-4 gap-y-2 print:gap-y-1">
            {sign.facts.map(({ label, value }) => (
              <div key={label} className={value.length > 44 ? 'col-span-2' : ''}>
                <dt className="text-sm text-ink2 print:text-[8.5pt]">{label}</dt>
                <dd className="text-lg leading-tight font-bold print:text-[11pt]">{value}</dd>
              </div>
            ))}
          </dl>
        </div>
        <div className="grid content-start gap-4 print:gap-2">
          <Steps sign={sign} />
          <Foot sign={sign} qr={qr} />
        </div>
      </div>
    </article>
  )
}

type PartProps = Pick<SignSheetProps, 'sign'>

function Head({ sign }: PartProps) {
  return (
    <div className="flex flex-wrap items-end gap-x-6 gap-y-2 border-b-4 border-ink pb-3 print:pb-2">
      <p className="text-5xl leading-none font-bold tracking-tight">
        <span className="sr-only">Bed </span>
        {sign.bed}
      </p>
      <div className="min-w-0">
        <p className="text-2xl leading-tight font-bold">{sign.name}</p>
        <p>{sign.identity}</p>
      </div>
      <div className="ml-auto text-right">
        <h2 className="text-2xl leading-tight font-bold">{sign.title}</h2>
        <p>{sign.where}</p>
      </div>
    </div>
  )
}

function Airway({ airway }: { readonly airway: BedHeadSign['airway'] }) {
  return (
    <p className="rounded-card border-4 border-ink px-4 py-3 print:py-2">
      <span className="block text-sm text-ink2">{airway.label}</span>
      <b className="block text-3xl leading-tight font-bold print:text-[22pt]">{airway.says}</b>
      <span className="text-lg leading-tight print:text-[11.5pt]">{airway.oxygen}</span>
    </p>
  )
}

function Steps({ sign: { stepsTitle, steps, cautions } }: PartProps) {
  return (
    <div>
      <h3 className="pb-1.5 text-xl print:text-[15pt]">{stepsTitle}</h3>
      <ol>
        {steps.map(({ act, next }, index) => (
          <li
            key={act}
            className="grid grid-cols-[1.5rem_1fr] gap-x-2 border-t border-line py-1.5 last:border-b print:py-1"
          >
            <span aria-hidden="true" className="font-bold">
              {index + 1}
            </span>
            <p>
              <b className="font-bold">{act}</b> {next}
            </p>
          </li>
        ))}
      </ol>
      <ul className="pt-1.5 font-bold print:text-[9.5pt]">
        {cautions.map(caution => (
          <li key={caution}>{caution}</li>
        ))}
      </ul>
    </div>
  )
}

function Foot({ sign: { numbersTitle, numbers, ends, aid }, qr }: SignSheetProps) {
  return (
    <div className="flex items-end gap-4">
      <div className="grid min-w-0 flex-1 gap-1">
        <p className="text-lg leading-tight font-bold print:text-[12pt]">
          {numbersTitle}: {numbers.map(({ who, number }) => `${who} ${number}`).join(' · ')}
        </p>
        <p className="font-bold">{ends}</p>
        <p className="text-sm text-ink2 print:text-[8pt]">{aid}</p>
      </div>
      <svg
        role="img"
        aria-label="QR symbol that leads to the patient’s page"
        viewBox={`-4 -4 ${qr.size + 8} ${qr.size + 8}`}
        className="size-28 flex-none print:size-[26mm]"
        shapeRendering="crispEdges"
      >
        {/* Black on white in every theme: cameras read no other. */}
        <rect x={-4} y={-4} width={qr.size + 8} height={qr.size + 8} fill="#ffffff" />
        <path d={qr.path} fill="#000000" />
      </svg>
    </div>
  )
}
