import { data, Form, Link } from 'react-router'
import { can } from '#app/auth/permissions.ts'
import { signedIn } from '#app/auth/signed-in.server.ts'
import { traceOf } from '#app/auth/trace.server.ts'
import { Button } from '#app/components/button.tsx'
import { Card } from '#app/components/card.tsx'
import { ChoiceField } from '#app/components/choice-field.tsx'
import { Empty } from '#app/components/empty.tsx'
import { Table } from '#app/components/table.tsx'
import { TextField } from '#app/components/text-field.tsx'
import { env } from '#app/env.server.ts'
import { sentForm } from '#app/sent-form.server.ts'
import { showDateTime, showDay } from '#app/time/display.ts'
import { logLook } from '#database/access-log.server.ts'
import { searchPatients } from '#database/patient-search.server.ts'
import type { StayWithPatient } from '#database/stays.server.ts'
import type { Route } from './+types/patients.ts'

const PAGE_SIZE = 25
const LONGEST_SEARCH = 100
const COLUMNS = ['Patient', 'Born', 'Record no.', 'Where', 'Admitted']

export const meta: Route.MetaFunction = () => [{ title: 'Patients | Cannulary' }]

export async function loader({ request, url, context }: Route.LoaderArgs) {
  return listed({ words: '', discharged: false, page: 1 }, { request, url, context })
}

/** Searched by POST, because a name has no place in an address, a history or a log. */
export async function action({ request, url, context }: Route.ActionArgs) {
  const form = await sentForm(request)
  const text = (name: string) => {
    const value = form.get(name)
    return typeof value === 'string' ? value : ''
  }
  const words = text('find').slice(0, LONGEST_SEARCH)
  const search = { words, discharged: text('discharged') === 'yes', page: pageOf(text('page')) }
  return listed(search, { request, url, context })
}

type Search = { readonly words: string; readonly discharged: boolean; readonly page: number }

async function listed(
  search: Search,
  { request, url, context }: Pick<Route.LoaderArgs, 'request' | 'url' | 'context'>,
) {
  const user = signedIn(context)
  const wardIds = user.wardIds.filter(wardId => can(user, 'see patients', wardId))
  if (wardIds.length === 0) throw data('Your role or your wards do not include patients.', 403)
  const found = await searchPatients({ ...search, wardIds, pageSize: PAGE_SIZE })
  const by = traceOf({ request, url, context })
  for (const wardId of wardIds) await logLook({ action: 'listed patients', purpose: 'TREAT', by, wardId })
  return {
    ...search,
    total: found.total,
    pages: Math.ceil(found.total / PAGE_SIZE),
    patients: found.patients.map(rowOf),
  }
}

function rowOf({ stay, patient }: StayWithPatient) {
  return {
    id: patient.id,
    name: `${patient.familyName.toUpperCase()}, ${patient.givenName}`,
    born: showDay(patient.bornOn),
    recordNumber: patient.recordNumber,
    where: stay.dischargedAt ? stay.wardName : `${stay.wardName}, bed ${stay.bedLabel}`,
    since: showDateTime(stay.admittedAt, env.hospitalTimeZone),
    until: stay.dischargedAt && showDateTime(stay.dischargedAt, env.hospitalTimeZone),
  }
}

/** A page number of a form; anything that is none is the first page. */
function pageOf(text: string) {
  return /^[1-9]\d{0,5}$/.test(text) ? Number(text) : 1
}

export default function Patients({ loaderData, actionData }: Route.ComponentProps) {
  const shown = actionData ?? loaderData
  const { words, discharged, patients, total } = shown
  return (
    <Form method="post" role="search" className="grid gap-4 px-4 py-5 md:px-6">
      <h1 className="text-2xl font-bold">Patients</h1>
      <TextField
        id="find"
        name="find"
        label="Find"
        hint="Parts of a name or record number, or a bed"
        defaultValue={words}
        maxLength={LONGEST_SEARCH}
        autoComplete="off"
      />
      <ChoiceField
        id="discharged"
        name="discharged"
        label="Who"
        options={{ no: 'Here now', yes: 'Discharged too' }}
        chosen={[discharged ? 'yes' : 'no']}
      />
      <Button className="justify-self-start">Find</Button>
      <Card flush>
        {patients.length === 0 ? (
          <Empty title="Nobody was found">{words && 'Check the spelling, or look among the discharged too.'}</Empty>
        ) : (
          <Table
            caption={`Patients: ${total}`}
            captionShown
            columns={[...COLUMNS, ...(discharged ? ['Discharged'] : [])].map(label => ({ label }))}
            rows={patients.map(patient => ({ key: patient.id, cells: cellsOf(patient) }))}
          />
        )}
        <Pages page={shown.page} pages={shown.pages} />
      </Card>
    </Form>
  )
}

function cellsOf({ id, name, born, recordNumber, where, since, until }: ReturnType<typeof rowOf>) {
  const link = (
    <Link key="name" to={`/patients/${id}`} className="inline-flex min-h-11 items-center underline underline-offset-3">
      {name}
    </Link>
  )
  const whole = (text: string) => <span className="whitespace-nowrap">{text}</span>
  return [link, whole(born), whole(recordNumber), where, whole(since), whole(until ?? '')]
}

interface PagesProps {
  readonly page: number
  readonly pages: number
}

/** Buttons of the search's own form, so that the words stay with it. */
function Pages({ page, pages }: PagesProps) {
  if (pages <= 1) return null
  return (
    <div className="flex items-center justify-between gap-3 p-4 print:hidden">
      <Button name="page" value={page - 1} disabled={page === 1}>
        Previous
      </Button>
      <span>
        Page {page} of {pages}
      </span>
      <Button name="page" value={page + 1} disabled={page >= pages}>
        Next
      </Button>
    </div>
  )
}
