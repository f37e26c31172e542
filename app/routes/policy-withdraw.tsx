import { getFormProps, useForm } from '@conform-to/react'
import { parseWithZod } from '@conform-to/zod/v4'
import { data, Form, redirect } from 'react-router'
import { can } from '#app/auth/permissions.ts'
import { signedIn } from '#app/auth/signed-in.server.ts'
import { traceOf } from '#app/auth/trace.server.ts'
import { LinkButton } from '#app/components/button.tsx'
import { Card } from '#app/components/card.tsx'
import { ErrorSummary } from '#app/components/error-summary.tsx'
import { FormFoot } from '#app/components/form-foot.tsx'
import { TextArea } from '#app/components/text-field.tsx'
import { errorsOf, textOf } from '#app/components/text-of.ts'
import { policyHref } from '#app/policies/policy-place.server.ts'
import { withdrawSchema } from '#app/policies/publish-schema.ts'
import { readForm, sentForm } from '#app/sent-form.server.ts'
import { policyVersions } from '#app/views/policy-overview.server.ts'
import { logAccess } from '#database/access-log.server.ts'
import { policies } from '#database/policies.server.ts'
import { withdrawPolicy } from '#database/policy-withdrawals.server.ts'
import type { Route } from './+types/policy-withdraw.ts'

export const meta: Route.MetaFunction = () => [{ title: 'Withdraw a version | Cannulary' }]

/** A version of a ward whose policy this person manages. */
async function managed({ context, params }: Pick<Route.LoaderArgs, 'context' | 'params'>) {
  const user = signedIn(context)
  if (!can(user, 'manage policy')) throw data('Policies are changed by charge nurses and specialists.', 403)
  const policy = (await policies()).find(({ id }) => id === params.policyId)
  if (!policy?.wardId || !can(user, 'manage policy', policy.wardId)) throw data('There is no such version.', 404)
  const { id, wardId, ruleSet } = policy
  return { user, policy: { id, wardId }, ruleSet, back: policyHref('', { ward: { id: wardId }, ruleSet }) }
}

export async function loader(arrived: Route.LoaderArgs) {
  const { policy, ruleSet, back } = await managed(arrived)
  const version = (await policyVersions(policy.wardId, ruleSet, new Date(), true)).find(({ id }) => id === policy.id)
  if (!version) throw data('There is no such version.', 404)
  return { version, back }
}

export async function action(arrived: Route.ActionArgs) {
  const { user, policy, back } = await managed(arrived)
  const submission = readForm(await sentForm(arrived.request), withdrawSchema)
  if (submission.status !== 'success') return data(submission.reply(), 400)
  const outcome = await withdrawPolicy(policy, submission.value.reason, user.id)
  if (outcome === 'started') {
    const says = 'This version has started: it stays. Publish another one to change what is in force.'
    return data(submission.reply({ formErrors: [says] }), 409)
  }
  const by = traceOf(arrived)
  await logAccess({ action: 'withdrew policy', purpose: 'ADMIN', by, wardId: policy.wardId })
  throw redirect(back)
}

/** Takes a version back that has not started. */
export default function PolicyWithdraw({ loaderData: { version, back }, actionData }: Route.ComponentProps) {
  const [form, fields] = useForm({
    lastResult: actionData ?? null,
    onValidate: ({ formData }) => parseWithZod(formData, { schema: withdrawSchema }),
    shouldRevalidate: 'onInput',
  })
  return (
    <div className="grid max-w-3xl gap-4 px-4 py-5 md:px-6">
      <h1 className="text-2xl font-bold">Withdraw {version.title}</h1>
      <p>{version.says}</p>
      {version.mayWithdraw ? (
        <Card>
          <Form method="post" {...getFormProps(form)} className="grid gap-5">
            <ErrorSummary title="Not withdrawn yet. Please check:" errors={errorsOf(form)} />
            <TextArea {...textOf(fields.reason)} label="Reason" />
            <FormFoot words="Withdraw" back={back} variant="danger" />
          </Form>
        </Card>
      ) : (
        <p>
          Only a version that has not started can be withdrawn. <LinkButton href={back}>Back to the policy</LinkButton>
        </p>
      )}
    </div>
  )
}
