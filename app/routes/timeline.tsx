import { patientContext } from '#app/auth/patient-access.server.ts'
import { can, canByGrant } from '#app/auth/permissions.ts'
import { signedIn } from '#app/auth/signed-in.server.ts'
import { BedSupplies } from '#app/components/bed-supplies.tsx'
import { Card } from '#app/components/card.tsx'
import { CareDue } from '#app/components/care-due.tsx'
import { CareStrip, SpanChoice } from '#app/components/care-strip.tsx'
import { ChartOther } from '#app/components/chart-other.tsx'
import { EntryList } from '#app/components/entry-list.tsx'
import { KindFilter } from '#app/components/kind-filter.tsx'
import { useLive } from '#app/components/live.ts'
import { Pager } from '#app/components/pager.tsx'
import { RunningActs } from '#app/components/running-acts.tsx'
import { Stale } from '#app/components/stale.tsx'
import { StandingWarnings } from '#app/components/standing-warnings.tsx'
import { TubeCard } from '#app/components/tube-card.tsx'
import { Warnings } from '#app/components/warnings.tsx'
import { liveTasks } from '#app/rules/board.ts'
import { chartableKinds } from '#app/rules/views.ts'
import { localDay } from '#app/time/zone.ts'
import { answeringOf } from '#app/views/answering.server.ts'
import { chartedNow } from '#app/views/charted-now.server.ts'
import { patientCare } from '#app/views/patient-context.server.ts'
import { suppliesAtBed } from '#app/views/patient-supplies.server.ts'
import { patientTimeline, spans, timelineQuery } from '#app/views/patient-timeline.server.ts'
import type { Route } from './+types/timeline.ts'

export async function loader({ context, url }: Route.LoaderArgs) {
  const user = signedIn(context)
  const opened = context.get(patientContext)
  const now = new Date()
  const patient = await patientCare(opened.stayId, now)
  const may = opened.via === 'ward' ? can(user, 'chart care', opened.wardId) : canByGrant(user, 'chart care')
  const { span, kind } = timelineQuery(url)
  const [served, supplies] = await Promise.all([patientTimeline(patient, url, now), suppliesAtBed(patient, now)])
  const { patientId, wardId } = opened
  return {
    served,
    supplies: supplies && {
      ...supplies,
      wardHref: can(user, 'keep supplies', wardId) ? `/wards/${wardId}/supplies` : null,
    },
    answering: answeringOf(served.data.care.warnings, { patientId, user, now }),
    charted: await chartedNow(patient, url.searchParams.get('charted')),
    span,
    spanHours: spans[span],
    spanNames: Object.keys(spans),
    kind: kind ?? null,
    charts: may && patient.record.stay.dischargedAt === null,
    chapters: chartableKinds(act => can(user, act, wardId) || canByGrant(user, act)),
    stayLinks: stayPages.flatMap(({ act, page, words }) =>
      can(user, act, wardId) ? [{ href: `/patients/${patientId}/${page}`, words }] : [],
    ),
    search: url.search,
  }
}

const stayPages = [
  { act: 'edit patient details', page: 'details', words: 'Edit details' },
  { act: 'move patients', page: 'move', words: 'Move to another bed' },
  { act: 'discharge patients', page: 'discharge', words: 'Discharge' },
] as const

/** One patient: the tube, what is due, the hours, and everything that was charted. */
export default function Timeline({ loaderData }: Route.ComponentProps) {
  const { served, supplies, answering, charted, charts, chapters, stayLinks, search } = loaderData
  const { span, spanHours, spanNames, kind } = loaderData
  const { patientId } = served.data
  const live = useLive(`/api/patients/${patientId}/timeline${search}`, served)
  const { data: shown, now } = live
  const { care, tube, zone } = shown
  const withParam = (name: string, value: string) => linkWith(search, name, value)
  const tasks = liveTasks(care.tasks, now)
  const tubeTask = tasks.find(task => task.name === care.tube?.task)
  return (
    <div className="px-4 py-5 md:px-6">
      <Stale since={live.staleSince === null ? null : new Date(live.staleSince)} zone={zone} />
      <div className="grid grid-cols-[minmax(0,1fr)] gap-5 lg:grid-cols-[21rem_minmax(0,1fr)] lg:grid-rows-[auto_1fr]">
        <div className="grid content-start gap-4 lg:col-start-2">
          {charted && (
            <Warnings
              title={charted.says}
              warnings={charted.warnings.filter(own => !care.warnings.some(({ name }) => name === own.name))}
            />
          )}
          <StandingWarnings
            warnings={care.warnings}
            why={shown.whyWarned}
            now={now}
            zone={zone}
            answering={charts ? answering : null}
          />
          <RunningActs {...{ patientId, now, zone, charts, tasks }} running={care.running} />
          <CareDue
            {...{ patientId, now, zone, charts }}
            tasks={care.tasks}
            why={shown.why}
            nothingDue={shown.nothingDue}
          />
          {charts && <ChartOther patientId={patientId} chapters={chapters} stayLinks={stayLinks} />}
        </div>
        <aside className="grid content-start gap-4 lg:col-start-1 lg:row-span-2 lg:row-start-1">
          <TubeCard
            tube={tube}
            status={tubeTask?.status ?? 'upcoming'}
            compareHref={`/catalogue/compare?patient=${patientId}`}
          />
          {supplies && <BedSupplies {...supplies} />}
        </aside>
        <div className="grid grid-cols-[minmax(0,1fr)] content-start gap-4 lg:col-start-2">
          <Card
            title={`Last ${spanHours.back} hours, next ${spanHours.ahead}`}
            aside={<SpanChoice names={spanNames} current={span} href={name => withParam('span', name)} />}
          >
            <CareStrip care={care} now={now} zone={zone} span={spanHours} />
          </Card>
          <Card
            title="Charted"
            flush
            id="charted"
            aside={<KindFilter kinds={chapters.flatMap(({ kinds }) => kinds)} current={kind} href={withParam} />}
          >
            <EntryList
              entries={shown.entries}
              today={localDay(new Date(now), zone)}
              photographsHref={`/patients/${patientId}/photographs`}
            />
            <Pager label="Charted" {...(shown.next ? { older: withParam('before', shown.next) } : {})} />
          </Card>
        </div>
      </div>
    </div>
  )
}

/** The address of this page with one thing changed; an empty value takes it out. A new filter starts at the newest entry. */
function linkWith(search: string, name: string, value: string): string {
  const params = new URLSearchParams(search)
  params.delete('charted')
  if (name === 'kind') params.delete('before')
  if (value === '') params.delete(name)
  else params.set(name, value)
  return `?${params}`
}
