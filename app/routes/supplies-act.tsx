import { getFormProps, useForm } from '@conform-to/react'
import { parseWithZod } from '@conform-to/zod/v4'
import { data, Form, redirect } from 'react-router'
import { v7 as uuidv7 } from 'uuid'
import type { z } from 'zod'
import { signedIn } from '#app/auth/signed-in.server.ts'
import { Card } from '#app/components/card.tsx'
import { ErrorSummary } from '#app/components/error-summary.tsx'
import { FormFoot } from '#app/components/form-foot.tsx'
import { MomentFields, momentErrorsOf } from '#app/components/stay-fields.tsx'
import { FindItem } from '#app/components/stock-fields.tsx'
import { SelectField, TextField } from '#app/components/text-field.tsx'
import { textOf } from '#app/components/text-of.ts'
import { env } from '#app/env.server.ts'
import { sentForm } from '#app/sent-form.server.ts'
import { stockActOf, stockActSchema, stockActs } from '#app/supplies/act-form.ts'
import { itemIn, placeIn, STOCK_DAYS_BACK, stockActedBy, stockChoices } from '#app/views/stock-act.server.ts'
import { suppliesGate } from '#app/views/supplies-gate.server.ts'
import type { Route } from './+types/supplies-act.ts'

const LONGEST_SEARCH = 100

export const meta: Route.MetaFunction = ({ params }) => [
  { title: `${stockActs[stockActOf(params.act) ?? 'receive'].title} | Supplies | Cannulary` },
]

function actOr404(name: string) {
  const act = stockActOf(name)
  if (!act) throw data('There is no such page.', 404)
  return act
}

export async function loader({ params, context, url }: Route.LoaderArgs) {
  const user = signedIn(context)
  const ward = await suppliesGate(user, params.wardId)
  const act = actOr404(params.act)
  const find = (url.searchParams.get('find') ?? '').trim().slice(0, LONGEST_SEARCH)
  const item = itemIn(url)
  const choices = await stockChoices(ward.id, { find, item })
  return {
    act,
    ward,
    find,
    choices,
    zone: env.hospitalTimeZone,
    daysBack: STOCK_DAYS_BACK,
    form: {
      ...{ id: uuidv7(), openedBy: user.id, at: new Date().toISOString() },
      ...{ item, from: placeIn(url, 'from', choices), to: placeIn(url, 'to', choices) },
    },
  }
}

export async function action({ params, context, request }: Route.ActionArgs) {
  const user = signedIn(context)
  const ward = await suppliesGate(user, params.wardId)
  const act = actOr404(params.act)
  const outcome = await stockActedBy(await sentForm(request), act, { user, wardId: ward.id, now: new Date() })
  if ('reply' in outcome) return data({ reply: outcome.reply }, outcome.status)
  throw redirect(outcome.to)
}

/** One act with the stock of a ward: what came, was moved, was counted, or thrown away. */
export default function SuppliesAct({ loaderData, actionData }: Route.ComponentProps) {
  const { act, ward, find } = loaderData
  return (
    <div className="grid max-w-3xl grid-cols-[minmax(0,1fr)] gap-4 px-4 py-5 md:px-6">
      <h1 className="text-2xl font-bold">
        {stockActs[act].title}: {ward.name}
      </h1>
      <FindItem find={find} found={loaderData.choices.found} longest={LONGEST_SEARCH} />
      <Card>
        <ActForm key={`${act} ${find}`} shown={loaderData} reply={actionData?.reply} />
      </Card>
    </div>
  )
}

interface ActFormProps {
  readonly shown: Route.ComponentProps['loaderData']
  readonly reply: NonNullable<Route.ComponentProps['actionData']>['reply'] | undefined
}

function ActForm({ shown, reply }: ActFormProps) {
  const { act, choices, zone, daysBack, ward } = shown
  const says = stockActs[act]
  const schema = stockActSchema(act)
  const [form, fields] = useForm<z.input<typeof schema>>({
    lastResult: reply ?? null,
    defaultValue: shown.form,
    onValidate: ({ formData }) => parseWithZod(formData, { schema }),
    shouldRevalidate: 'onInput',
  })
  const { item, quantity, from, to, reason } = fields
  const into = { ...choices.places, ...(act === 'move' ? choices.otherWards : {}) }
  return (
    <Form method="post" {...getFormProps(form)} className="grid gap-5">
      <ErrorSummary title="Not charted yet. Please check:" errors={momentErrorsOf(form)} />
      <SelectField key={item.key} {...textOf(item)} label="Item" options={choices.items} nothing="Choose an item" />
      {says.from !== null && (
        <SelectField
          key={from.key}
          {...textOf(from)}
          label={says.from}
          options={choices.places}
          nothing="Choose a place"
        />
      )}
      {says.to !== null && (
        <SelectField key={to.key} {...textOf(to)} label={says.to} options={into} nothing="Choose a place" />
      )}
      <TextField
        key={quantity.key}
        {...textOf(quantity)}
        label={says.quantity}
        hint="Single pieces, not boxes"
        inputMode="numeric"
        autoComplete="off"
        short
      />
      <MomentFields fields={fields} zone={zone} label="When" daysBack={daysBack} />
      <TextField key={reason.key} {...textOf(reason)} label="Reason" optional={act !== 'waste'} autoComplete="off" />
      <FormFoot words={says.button} back={`/wards/${ward.id}/supplies`} />
    </Form>
  )
}
