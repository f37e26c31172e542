import { getFormProps, type SubmissionResult, useForm } from '@conform-to/react'
import { parseWithZod } from '@conform-to/zod/v4'
import { data, Form, redirect } from 'react-router'
import { v7 as uuidv7 } from 'uuid'
import { traceOf } from '#app/auth/trace.server.ts'
import { Button, LinkButton } from '#app/components/button.tsx'
import { Card } from '#app/components/card.tsx'
import { DifferenceList } from '#app/components/difference-list.tsx'
import { Empty } from '#app/components/empty.tsx'
import { ErrorSummary } from '#app/components/error-summary.tsx'
import { Notice } from '#app/components/notice.tsx'
import { PolicyNav } from '#app/components/policy-nav.tsx'
import { PublishFields } from '#app/components/publish-fields.tsx'
import { errorsOf } from '#app/components/text-of.ts'
import { WhatIfTables } from '#app/components/what-if-tables.tsx'
import { env } from '#app/env.server.ts'
import { policyHref, policyPlace } from '#app/policies/policy-place.server.ts'
import { publishedBy, reviewersFor } from '#app/policies/publish-form.server.ts'
import { publishSchema } from '#app/policies/publish-schema.ts'
import { sentForm } from '#app/sent-form.server.ts'
import { localDay } from '#app/time/zone.ts'
import { policyName, policyReview } from '#app/views/policy-review.server.ts'
import { logAccess } from '#database/access-log.server.ts'
import { policyDraft } from '#database/policy-drafts.server.ts'
import type { Route } from './+types/policy-review.ts'

export const meta: Route.MetaFunction = () => [{ title: 'Compare and publish a policy | Cannulary' }]

export async function loader({ context, url }: Route.LoaderArgs) {
  const place = await policyPlace({ context, url }, 'manage policy')
  const { wards, ward, ruleSet } = place
  const now = new Date()
  const draft = await policyDraft({ wardId: ward.id, ruleSet })
  const about = { wards, ruleSet, ward: { id: ward.id, name: ward.name }, edit: policyHref('/draft', place) }
  if (!draft) return { ...about, review: null }
  const others = wards.filter(({ id }) => id !== ward.id)
  const reviewers = await reviewersFor(place, draft)
  return {
    ...about,
    review: await policyReview(draft, ward, now),
    form: {
      id: uuidv7(),
      rev: draft.rev,
      name: await policyName(ward, ruleSet, now),
      reviewedOn: localDay(now, env.hospitalTimeZone),
    },
    otherWards: Object.fromEntries(others.map(({ id, name }) => [id, name])),
    reviewers: Object.fromEntries(reviewers.map(({ id, name, role }) => [id, `${name}, ${role}`])),
  }
}

export async function action({ request, context, url }: Route.ActionArgs) {
  const place = await policyPlace({ context, url }, 'manage policy')
  const outcome = await publishedBy(await sentForm(request), place, new Date())
  if (outcome.is === 'refused') return data(outcome.reply, outcome.status)
  const by = traceOf({ request, url, context })
  await logAccess({ action: 'published policy', purpose: 'ADMIN', by, wardId: place.ward.id })
  throw redirect(`${policyHref('', place)}&published`)
}

/** A draft beside the version in force: what differs, what it would have asked for, and the form that publishes it. */
export default function PolicyReview({ loaderData, actionData }: Route.ComponentProps) {
  const { wards, ward, ruleSet, edit } = loaderData
  return (
    <div className="grid grid-cols-[minmax(0,1fr)] gap-5 px-4 py-5 md:px-6">
      <header className="grid gap-3">
        <h1 className="text-2xl font-bold">
          Compare and publish, {ward.name}
          {ruleSet === 'children' ? ', children' : ''}
        </h1>
        <PolicyNav page="/policy/review" wards={wards} ward={ward.id} ruleSet={ruleSet} />
        <p>
          <LinkButton href={edit}>Back to the draft</LinkButton>
        </p>
      </header>
      {loaderData.review === null ? (
        <Empty title="No draft is saved for this ward" />
      ) : (
        <Review shown={loaderData} reply={actionData} />
      )}
    </div>
  )
}

type Shown = Extract<Route.ComponentProps['loaderData'], { readonly form: unknown }>

interface ReviewProps {
  readonly shown: Shown
  readonly reply: SubmissionResult<string[]> | undefined
}

function Review({ shown, reply }: ReviewProps) {
  const { review, form } = shown
  return (
    <>
      {review.problems.length > 0 && (
        <Notice tone="amber" action="This draft cannot be published yet.">
          {review.problems.join('. ')}.
        </Notice>
      )}
      <Card title="Differences from the version in force">
        <DifferenceList differences={review.differences} />
      </Card>
      <Card title="What it would have asked for" flush>
        <WhatIfTables whatIf={review.whatIf} />
      </Card>
      <Card title="Publish">
        <PublishForm key={form.rev} shown={shown} reply={reply} />
      </Card>
    </>
  )
}

function PublishForm({ shown, reply }: ReviewProps) {
  const [form, fields] = useForm({
    lastResult: reply ?? null,
    defaultValue: { ...shown.form, start: 'now' },
    onValidate: ({ formData }) => parseWithZod(formData, { schema: publishSchema }),
    shouldRevalidate: 'onInput',
  })
  return (
    <Form method="post" {...getFormProps(form)} className="grid gap-5">
      <ErrorSummary title="Not published yet. Please check:" errors={errorsOf(form)} />
      <input type="hidden" name="id" value={shown.form.id} />
      <input type="hidden" name="rev" value={shown.form.rev} />
      <PublishFields fields={fields} reviewers={shown.reviewers} wards={shown.otherWards} />
      <Button variant="primary" size={56} className="justify-self-start">
        Publish
      </Button>
    </Form>
  )
}
