import { data, Form, redirect } from 'react-router'
import { traceOf } from '#app/auth/trace.server.ts'
import { Button, LinkButton } from '#app/components/button.tsx'
import { DifferenceList } from '#app/components/difference-list.tsx'
import { ErrorSummary } from '#app/components/error-summary.tsx'
import { Notice } from '#app/components/notice.tsx'
import { type FieldSection, PolicyFields } from '#app/components/policy-editor.tsx'
import { PolicyNav } from '#app/components/policy-nav.tsx'
import { draftChangedBy } from '#app/policies/draft-form.server.ts'
import { draftPage } from '#app/policies/draft-page.server.ts'
import { policyHref, policyPlace } from '#app/policies/policy-place.server.ts'
import { sentForm } from '#app/sent-form.server.ts'
import { logAccess } from '#database/access-log.server.ts'
import type { Route } from './+types/policy-draft.ts'

export const meta: Route.MetaFunction = () => [{ title: 'Draft of a policy | Cannulary' }]

export async function loader({ context, url }: Route.LoaderArgs) {
  const place = await policyPlace({ context, url }, 'manage policy')
  const { wards, ward, ruleSet } = place
  return {
    ...{ wards, ruleSet },
    ward: { id: ward.id, name: ward.name },
    draft: await draftPage(place, new Date()),
    review: policyHref('/review', place),
    find: url.searchParams.get('find') ?? '',
    changedOnly: url.searchParams.has('changed'),
  }
}

export async function action({ request, context, url }: Route.ActionArgs) {
  const place = await policyPlace({ context, url }, 'manage policy')
  const sent = await sentForm(request)
  const reply = await draftChangedBy(sent, place, new Date())
  if (reply.is === 'refused') return data(reply, reply.status)
  const what = reply.is === 'kept' ? 'saved draft of policy' : 'discarded draft of policy'
  await logAccess({ action: what, purpose: 'ADMIN', by: traceOf({ request, url, context }), wardId: place.ward.id })
  if (reply.is === 'discarded') throw redirect(policyHref('', place))
  throw redirect(policyHref(sent.get('intent') === 'review' ? '/review' : '/draft', place))
}

/** The numbers of the next version. */
export default function PolicyDraft({ loaderData, actionData }: Route.ComponentProps) {
  const { wards, ward, ruleSet, draft, review, find, changedOnly } = loaderData
  const stale = actionData?.stale
  const sections = actionData ? withTyped(draft.sections, actionData) : draft.sections
  const errors = Object.entries(actionData?.errors ?? {}).map(([name, says]) =>
    name === '' ? { says } : { fieldId: `setting-${name}`, says: `${labelOf(sections, name)}: ${says}` },
  )
  return (
    <div className="grid grid-cols-[minmax(0,1fr)] gap-5 px-4 py-5 md:px-6">
      <header className="grid gap-3">
        <h1 className="text-2xl font-bold">
          Draft, {ward.name}
          {ruleSet === 'children' ? ', children' : ''}
        </h1>
        <p className="max-w-prose text-ink2">
          {draft.saved ?? 'Nothing is saved yet: this starts from what is in force.'} A draft changes no due care. It
          counts once it is published with its reviewer.
        </p>
        <PolicyNav page="/policy/draft" wards={wards} ward={ward.id} ruleSet={ruleSet} />
      </header>
      <form id="look" method="get" className="hidden">
        <input type="hidden" name="ward" value={ward.id} />
        {ruleSet === 'children' && <input type="hidden" name="set" value="children" />}
      </form>
      <Form method="post" className="grid grid-cols-[minmax(0,1fr)] gap-5" noValidate>
        <input type="hidden" name="rev" value={stale?.rev ?? draft.rev} />
        <ErrorSummary title="Not saved yet. Please check:" errors={errors} />
        {stale && <StaleNotice stale={stale} />}
        <PolicyFields key={draft.rev} sections={sections} find={find} changedOnly={changedOnly} />
        <div
          data-final-bar
          className="sticky bottom-0 z-10 flex flex-wrap gap-3 border-t border-line bg-paper py-3 print:hidden"
        >
          <Button name="intent" value="save" size={48} variant="primary">
            Save draft
          </Button>
          <Button name="intent" value="review" size={48}>
            Save and compare
          </Button>
          {draft.rev > 0 && (
            <>
              <LinkButton href={review} size={48}>
                Compare as saved
              </LinkButton>
              <Button name="intent" value="discard" size={48} variant="danger">
                Discard draft
              </Button>
            </>
          )}
        </div>
      </Form>
    </div>
  )
}

type Refused = NonNullable<Route.ComponentProps['actionData']>

function StaleNotice({ stale }: { readonly stale: NonNullable<Refused['stale']> }) {
  return (
    <Notice tone="amber" action="Not saved yet." answer={<DifferenceList differences={stale.theirs} />}>
      {stale.says} Your numbers are kept below; saving again replaces theirs.
    </Notice>
  )
}

function withTyped(sections: readonly FieldSection[], { typed, errors }: Refused): readonly FieldSection[] {
  return sections.map(section => ({
    ...section,
    fields: section.fields.map(field => ({
      ...field,
      value: typed[field.name] ?? field.value,
      error: errors[field.name] ?? null,
    })),
  }))
}

function labelOf(sections: readonly FieldSection[], name: string): string {
  return sections.flatMap(({ fields }) => fields).find(field => field.name === name)?.label ?? name
}
