import type { SubmissionResult } from '@conform-to/react'
import { can } from '#app/auth/permissions.ts'
import { env } from '#app/env.server.ts'
import { policyProblems } from '#app/rules/policy-values.ts'
import { readForm } from '#app/sent-form.server.ts'
import { instantsOf, localDay } from '#app/time/zone.ts'
import { type NewPolicy, policyIdFor } from '#database/policies.server.ts'
import { type PolicyDraft, policyDraft, publishDraft } from '#database/policy-drafts.server.ts'
import { type Member, membersOf } from '#database/users.server.ts'
import type { PolicyPlace } from './policy-place.server.ts'
import { type Publication, publishSchema } from './publish-schema.ts'

/** What came of publishing: done, or the form with what is wrong with it. */
export type Published =
  | { readonly is: 'published' }
  | { readonly is: 'refused'; readonly status: 400 | 409; readonly reply: SubmissionResult<string[]> }

const FURTHEST_AHEAD_MS = 366 * 86_400_000

/** Who may be named as reviewer of a ward's policy: those who may manage it, but for its authors. */
export async function reviewersFor({ ward, user }: PolicyPlace, draft: PolicyDraft): Promise<readonly Member[]> {
  const members = await membersOf(ward.id)
  return members.filter(
    ({ id, role }) =>
      id !== user.id && id !== draft.changedById && can({ role, wardIds: [ward.id] }, 'manage policy', ward.id),
  )
}

/** Publishes the draft of a ward as a form says, for that ward and others chosen with it. */
export async function publishedBy(sent: FormData, place: PolicyPlace, now: Date): Promise<Published> {
  const submission = readForm(sent, publishSchema)
  if (submission.status !== 'success') return { is: 'refused', status: 400, reply: submission.reply() }
  const form = submission.value
  const { ward, ruleSet, user } = place
  const draft = await policyDraft({ wardId: ward.id, ruleSet })
  if (draft && draft.rev === form.rev) {
    const fieldErrors = await problemsOf(form, place, draft, now)
    if (Object.keys(fieldErrors).length > 0)
      return { is: 'refused', status: 400, reply: submission.reply({ fieldErrors }) }
  }
  const versions = draft ? await versionsOf(form, place, draft, now) : idsOnly(form, place)
  const { outcome } = await publishDraft({ wardId: ward.id, ruleSet, rev: form.rev }, versions, user.id)
  if (outcome === 'done') return { is: 'published' }
  return { is: 'refused', status: 409, reply: submission.reply({ formErrors: [MOVED_ON] }) }
}

const MOVED_ON = 'The draft has changed since you opened this page. Look at it again before you publish it.'

type Problems = Record<string, string[]>

async function problemsOf(form: Publication, place: PolicyPlace, draft: PolicyDraft, now: Date): Promise<Problems> {
  const problems: Problems = {}
  const reviewer = await reviewerProblem(form, place, draft)
  if (reviewer) problems[reviewer.field] = [reviewer.says]
  if (form.reviewedOn > localDay(now, env.hospitalTimeZone))
    problems.reviewedOn = ['The review must not be in the future']
  const start = startOf(form, now)
  if (!('at' in start)) problems[start.field] = [start.problem]
  if (wardsOf(form, place).some(id => !can(place.user, 'manage policy', id)))
    problems.wards = ['Choose wards whose policy you manage']
  const unfit = policyProblems(place.ruleSet, draft.values)
  if (unfit.length > 0) problems.name = [`The draft cannot be published yet. ${unfit.join('. ')}`]
  return problems
}

async function reviewerProblem(form: Publication, place: PolicyPlace, draft: PolicyDraft) {
  const { reviewer, otherReviewer, otherRole } = form
  if (reviewer && otherReviewer) return { field: 'otherReviewer', says: 'Name one reviewer: from the list or by name' }
  if (reviewer) {
    const known = (await reviewersFor(place, draft)).some(({ id }) => id === reviewer)
    return known ? undefined : { field: 'reviewer', says: 'The reviewer must be somebody other than the author' }
  }
  if (!otherReviewer) return { field: 'reviewer', says: 'Choose the reviewer, or enter the name of somebody else' }
  if (!otherRole) return { field: 'otherRole', says: 'Enter the role of the reviewer' }
  const authors = [place.user.name, draft.changedByName].map(nameOnly)
  return authors.includes(nameOnly(otherReviewer))
    ? { field: 'otherReviewer', says: 'The reviewer must be somebody other than the author' }
    : undefined
}

const nameOnly = (name: string): string =>
  name
    .toLowerCase()
    .replace(/[^\p{L}]+/gu, ' ')
    .trim()

type Start = { readonly at: Date } | { readonly field: 'day' | 'time'; readonly problem: string }

/** The moment from which a version counts. Never in the past: what was due then was judged by the version of that time. */
function startOf({ start, day, time }: Publication, now: Date): Start {
  if (start === 'now') return { at: now }
  if (!day) return { field: 'day', problem: 'Enter the day on which it starts' }
  if (!time) return { field: 'time', problem: 'Enter the time at which it starts' }
  const instants = instantsOf(day, time, env.hospitalTimeZone)
  if (instants.kind !== 'one') return { field: 'time', problem: 'The clocks change then. Choose another time' }
  if (instants.at <= now) return { field: 'time', problem: 'It must start later than now' }
  if (instants.at.getTime() - now.getTime() > FURTHEST_AHEAD_MS)
    return { field: 'day', problem: 'It must start within a year' }
  return { at: instants.at }
}

function wardsOf({ wards = [] }: Publication, { ward }: PolicyPlace): readonly string[] {
  return [...new Set([ward.id, ...wards])]
}

async function versionsOf(
  form: Publication,
  place: PolicyPlace,
  draft: PolicyDraft,
  now: Date,
): Promise<readonly NewPolicy[]> {
  const start = startOf(form, now)
  const member = (await reviewersFor(place, draft)).find(({ id }) => id === form.reviewer)
  const reviewedBy = member ? `${member.name}, ${member.role}` : `${form.otherReviewer}, ${form.otherRole}`
  return wardsOf(form, place).map(wardId => ({
    id: policyIdFor(form.id, wardId),
    name: form.name,
    wardId,
    ruleSet: place.ruleSet,
    reviewedBy,
    reviewerId: member?.id ?? null,
    reviewedOn: form.reviewedOn,
    startsAt: 'at' in start ? start.at : now,
    reason: form.reason,
    values: draft.values,
  }))
}

/** Of a form whose draft is gone: enough to tell whether it was published by this very form. */
function idsOnly(form: Publication, place: PolicyPlace): readonly NewPolicy[] {
  const nothing = { name: '', reviewedBy: '', reviewedOn: '', startsAt: new Date(0), reason: '', values: {} }
  return wardsOf(form, place).map(wardId => ({ ...nothing, id: policyIdFor(form.id, wardId), wardId }))
}
