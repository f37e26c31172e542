import { data, redirect } from 'react-router'
import { v7 as uuidv7 } from 'uuid'
import { can } from '#app/auth/permissions.ts'
import { signedIn } from '#app/auth/signed-in.server.ts'
import { gtin14 } from '#app/clinical/gs1-gtin.ts'
import { ItemForm } from '#app/components/item-form.tsx'
import { sentForm } from '#app/sent-form.server.ts'
import { idIn, savedFrom } from '#app/views/catalogue-form.server.ts'
import { itemKindOr404 } from '#app/views/catalogue-item.server.ts'
import { tubeLines } from '#database/catalogue.server.ts'
import type { Route } from './+types/catalogue-item-new.ts'

export const meta: Route.MetaFunction = () => [{ title: 'Add to the catalogue | Cannulary' }]

export async function loader({ params: { items }, context, url }: Route.LoaderArgs) {
  const kind = itemKindOr404(items)
  if (!can(signedIn(context), 'manage catalogue')) throw data(KEPT_BY, 403)
  // From a scan of what nobody has described yet.
  const gtin = gtin14(url.searchParams.get('gtin') ?? '') ?? ''
  return { kind, id: uuidv7(), gtin, lines: await tubeLines() }
}

export async function action({ params: { items }, request, context }: Route.ActionArgs) {
  const user = signedIn(context)
  const kind = itemKindOr404(items)
  if (!can(user, 'manage catalogue')) throw data(KEPT_BY, 403)
  const sent = await sentForm(request)
  const id = idIn(sent)
  const refusal = await savedFrom(sent, { kind, id, version: null, retired: false, fitting: [], by: user.id })
  return refusal ? data({ ...refusal, id }, 400) : redirect(`/catalogue/${items}/${id}`)
}

const KEPT_BY = 'The catalogue is kept by the tracheostomy specialist and the administrators.'

export default function NewItem({ loaderData: { kind, id, gtin, lines }, actionData }: Route.ComponentProps) {
  return (
    <div className="grid gap-4 px-4 py-5 md:px-6">
      <h1 className="text-2xl font-bold">{kind === 'tube' ? 'Add a tube' : 'Add an inner cannula'}</h1>
      <p className="max-w-3xl">
        Lines so far: {lines.map(({ line, maker }) => `${line} (${maker})`).join(', ') || 'none'}. A line that is not
        among them is added with the item.
        {kind === 'tube' && ' Which inner cannulas fit is asked once the tube is there.'}
      </p>
      <ItemForm
        kind={kind}
        id={actionData?.id ?? id}
        version={null}
        typed={actionData?.typed ?? { gtin: [gtin] }}
        errors={actionData?.errors ?? {}}
        fitting={{}}
        words="Add to the catalogue"
        cancelHref="/catalogue"
      />
    </div>
  )
}
