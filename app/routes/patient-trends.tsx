import { patientContext } from '#app/auth/patient-access.server.ts'
import { Card } from '#app/components/card.tsx'
import { SpanChoice } from '#app/components/care-strip.tsx'
import { Empty } from '#app/components/empty.tsx'
import { PlotPatterns } from '#app/components/plot-shapes.tsx'
import { StripPatterns } from '#app/components/strip-patterns.tsx'
import { FindingsCard, LengthsCard, MeasureCard, type Shown } from '#app/components/trend-card.tsx'
import type { TrendView } from '#app/rules/trends.ts'
import { showDateTime } from '#app/time/display.ts'
import { patientCare } from '#app/views/patient-context.server.ts'
import { patientTrends, trendSpanOf, trendSpans } from '#app/views/patient-trends.server.ts'
import type { Route } from './+types/patient-trends.ts'

export const meta: Route.MetaFunction = () => [{ title: 'Trends | Cannulary' }]

export async function loader({ context, url }: Route.LoaderArgs) {
  const now = new Date()
  const care = await patientCare(context.get(patientContext).stayId, now)
  const span = trendSpanOf(url)
  const shown = await patientTrends(care, span, now)
  return { shown, span, spanNames: Object.keys(trendSpans), nothing: shown === null ? care.nothingDue : null }
}

/** How a patient's numbers and findings went over the days: each as a plot with the table of its values. */
export default function PatientTrends({ loaderData: { shown, span, spanNames, nothing } }: Route.ComponentProps) {
  if (!shown) {
    return (
      <div className="px-4 py-5 md:px-6">
        <h1 className="text-2xl font-bold">Trends</h1>
        <Empty title="No trends">{nothing}</Empty>
      </div>
    )
  }
  const { trends, from, to, now, zone } = shown
  const filled = trends.filter(isFilled)
  const empty = trends.filter(trend => !isFilled(trend)).map(({ title }) => title)
  return (
    <div className="grid grid-cols-[minmax(0,1fr)] gap-4 px-4 py-5 md:px-6">
      <StripPatterns />
      <PlotPatterns />
      <div className="flex flex-wrap items-center justify-between gap-3">
        <div>
          <h1 className="text-2xl font-bold">Trends</h1>
          <p className="text-ink2">
            {`${showDateTime(new Date(from), zone)} to ${showDateTime(new Date(to), zone)}. Entries that were corrected or retracted do not count.`}
          </p>
        </div>
        <SpanChoice label="Span of the trends" names={spanNames} current={span} href={spanHref} />
      </div>
      {filled.map(trend => (
        <OneTrend
          key={trend.name}
          trend={trend}
          span={{ from: new Date(from), to: new Date(to) }}
          now={now}
          zone={zone}
        />
      ))}
      {filled.length === 0 ? (
        <Empty title="Nothing was charted in this span that makes a trend">
          Choose a longer span, or chart care first.
        </Empty>
      ) : (
        empty.length > 0 && <Card title="Not charted in this span">{`${empty.join(', ')}.`}</Card>
      )}
    </div>
  )
}

const spanHref = (name: string) => `?${new URLSearchParams({ span: name })}`

function isFilled(trend: TrendView): boolean {
  if (trend.shape === 'measure') return trend.readings.length > 0
  return trend.shape === 'findings' ? trend.days.some(({ looks }) => looks.length > 0) : trend.groups.length > 0
}

function OneTrend({ trend, ...shown }: Shown & { readonly trend: TrendView }) {
  if (trend.shape === 'measure') return <MeasureCard view={trend} {...shown} />
  return trend.shape === 'findings' ? <FindingsCard view={trend} {...shown} /> : <LengthsCard view={trend} {...shown} />
}
