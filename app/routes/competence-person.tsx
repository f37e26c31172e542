import { data, redirect } from 'react-router'
import { v7 as uuidv7 } from 'uuid'
import { can } from '#app/auth/permissions.ts'
import { signedIn } from '#app/auth/signed-in.server.ts'
import { traceOf } from '#app/auth/trace.server.ts'
import { levels, type Skill, skills, standingWords } from '#app/care/skills.ts'
import { LinkButton } from '#app/components/button.tsx'
import { Card } from '#app/components/card.tsx'
import { CompetenceReminders } from '#app/components/competence-reminders.tsx'
import { DataList } from '#app/components/data-list.tsx'
import { SignOffForm } from '#app/components/sign-off-form.tsx'
import { SignOffHistory } from '#app/components/sign-off-history.tsx'
import { env } from '#app/env.server.ts'
import { skillsAskedFor, standingIn } from '#app/rules/competence.ts'
import { sentForm } from '#app/sent-form.server.ts'
import { showDateTime, showDay } from '#app/time/display.ts'
import { openedCompetence } from '#app/views/competence.server.ts'
import { remindersOf } from '#app/views/competence-reminders.server.ts'
import { signedOff } from '#app/views/sign-off.server.ts'
import type { Route } from './+types/competence-person.ts'

export const meta: Route.MetaFunction = ({ loaderData }) => [
  { title: `Competence of ${loaderData?.name ?? 'a person'} | Cannulary` },
]

export async function loader({ params: { userId }, context, url }: Route.LoaderArgs) {
  const user = signedIn(context)
  const now = new Date()
  const opened = await openedCompetence(user, userId, now)
  if (!opened) throw data('There is no such person.', 404)
  const { person, signOffs, assessable, today } = opened
  return {
    reminders: await remindersOf(person, signOffs, person.wards[0]?.id, now),
    ...{ id: uuidv7(), name: person.name, role: person.role, email: user.email, today },
    isSigned: url.searchParams.has('signed'),
    mayList: can(user, 'see competence gaps'),
    assessable: Object.fromEntries(assessable.map(skill => [skill, skills[skill]])),
    asked: skillsAskedFor().map(skill => ({
      label: skills[skill],
      value: standingWords[standingIn(signOffs, skill, today)],
    })),
    history: signOffs.map(one => ({
      id: one.id,
      skill: Object.hasOwn(skills, one.skill) ? skills[one.skill as Skill] : one.skill,
      says: `${levels[one.level]}. Assessed on ${showDay(one.assessedOn)} by ${one.assessedByName}, until ${showDay(one.expiresOn)}.`,
      withdrawn:
        one.withdrawn &&
        `Withdrawn on ${showDateTime(one.withdrawn.at, env.hospitalTimeZone)} by ${one.withdrawn.by}: ${one.withdrawn.reason}`,
      mayWithdraw:
        one.withdrawn === null &&
        userId !== user.id &&
        (can(user, 'sign off competence') || one.assessedById === user.id),
    })),
  }
}

export async function action({ params: { userId }, context, request, url }: Route.ActionArgs) {
  const user = signedIn(context)
  const now = new Date()
  const opened = await openedCompetence(user, userId, now)
  if (!opened) throw data('There is no such person.', 404)
  if (opened.assessable.length === 0) throw data('A skill is signed off by an assessor of it, or the educator.', 403)
  const by = traceOf({ request, url, context })
  const refused = await signedOff(opened, { user, form: await sentForm(request), by, now })
  return refused ? data(refused, refused.status) : redirect(`/competence/${userId}?signed=yes`)
}

/** One person's sign-offs, all of them, and the form of whoever may add one. */
export default function PersonCompetence({ loaderData: view, actionData }: Route.ComponentProps) {
  const refusedIn = (intent: 'sign off' | 'withdraw') => (actionData?.intent === intent ? actionData : undefined)
  return (
    <div className="grid max-w-4xl gap-4 px-4 py-5 md:px-6">
      <header>
        <h1 className="text-2xl font-bold">{`Competence of ${view.name}`}</h1>
        <p className="text-ink2">{view.role}</p>
      </header>
      <div role="status" className="empty:-mb-4">
        {view.isSigned && !actionData && <p className="font-semibold text-brand">Signed.</p>}
      </div>
      <CompetenceReminders reminders={view.reminders} />
      <Card title="Skills that an act asks for">
        <DataList items={view.asked} />
      </Card>
      {Object.keys(view.assessable).length > 0 && <SignOffForm {...view} refused={refusedIn('sign off')} />}
      <Card title="All sign-offs, latest first" flush>
        <SignOffHistory lines={view.history} email={view.email} refused={refusedIn('withdraw')} />
      </Card>
      {view.mayList && (
        <div>
          <LinkButton href="/competence">Staff competence</LinkButton>
        </div>
      )}
    </div>
  )
}
