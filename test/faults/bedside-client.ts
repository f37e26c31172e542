import { setTimeout as pause } from 'node:timers/promises'
import { v7 as uuidv7 } from 'uuid'
import { rowsOf, type StartedApp } from '#test/journeys/app.ts'
import { passphrase } from '#test/journeys/bedside.ts'

/** One chart form, as it may be sent any number of times. */
export interface ChartForm {
  readonly id: string
  readonly path: string
  readonly body: URLSearchParams
}

/** Somebody who charts over HTTP alone, without a browser. */
export interface BedsideClient {
  /** A form that charts a cuff pressure as found now. */
  pressureForm(patientId: string, found: number): ChartForm
  /** Sends a form once. Throws when no answer came. */
  send(form: ChartForm): Promise<Response>
  /** Reads a page. */
  read(path: string): Promise<Response>
}

/** Signs a demo account in, such as `nurse.alder`. */
export async function bedsideClient(app: StartedApp, who: string): Promise<BedsideClient> {
  const email = `${who}@example.org`
  const [person] = await rowsOf<{ id: string }>(app, 'SELECT id FROM users WHERE email = :email', { email })
  const post = (path: string, body: URLSearchParams, cookie: string) =>
    fetch(app.url + path, {
      method: 'POST',
      body,
      redirect: 'manual',
      headers: { Origin: app.url, Cookie: cookie },
    })
  const signedIn = await post('/sign-in', new URLSearchParams({ email, password: passphrase }), '')
  const cookie = signedIn.headers.get('Set-Cookie')?.split(';')[0]
  if (!person || cookie === undefined) throw new Error(`${who} was not signed in: ${signedIn.status}`)
  return {
    pressureForm(patientId, found) {
      const id = uuidv7()
      const body = new URLSearchParams({
        id,
        openedBy: person.id,
        at: new Date().toISOString(),
        when: 'now',
        'care.found': String(found),
        'care.unit': 'cmH2O',
        'care.method': 'manometer',
      })
      return { id, path: `/patients/${patientId}/chart/cuff-pressure`, body }
    },
    send: form => post(form.path, form.body, cookie),
    read: path => fetch(app.url + path, { redirect: 'manual', headers: { Cookie: cookie } }),
  }
}

/** True when the answer says that this form is charted. */
export function acknowledges(answer: Response, { id }: ChartForm): boolean {
  return answer.status === 302 && answer.headers.get('Location')?.endsWith(`?charted=${id}`) === true
}

/** The patients of a ward, by the ward's name. */
export async function patientIdsOn(app: StartedApp, wardName: string): Promise<string[]> {
  const rows = await rowsOf<{ id: string }>(
    app,
    `SELECT s.patient_id AS id FROM stays s JOIN wards w ON w.id = s.ward_id
     WHERE w.name = :wardName AND s.discharged_at IS NULL ORDER BY s.id`,
    { wardName },
  )
  return rows.map(({ id }) => id)
}

/** How many entries were charted under each of these ids; an id that is not there has none. */
export async function timesCharted(app: StartedApp, ids: readonly string[]): Promise<Map<string, number>> {
  const rows = await rowsOf<{ id: string; times: number }>(
    app,
    'SELECT id, COUNT(*) AS times FROM entries WHERE id IN (:ids) GROUP BY id',
    { ids: ['', ...ids] },
  )
  return new Map(rows.map(({ id, times }) => [id, times]))
}

/** All entries there are. */
export async function entryCount(app: StartedApp): Promise<number> {
  const [row] = await rowsOf<{ entries: number }>(app, 'SELECT COUNT(*) AS entries FROM entries')
  return row?.entries ?? 0
}

/** What writers have done so far. */
export interface Writing {
  readonly acknowledged: Set<string>
  /** Sent again because no answer, or a refusal of the server's, had come. */
  readonly repeated: Set<string>
  /** Lets each writer finish the form it holds, and waits for that. */
  finish(): Promise<void>
}

/** Lets people chart one form after another, each until it is acknowledged, as a person would who sees that it was not. */
export function writing(clients: readonly BedsideClient[], patientIds: readonly string[]): Writing {
  const acknowledged = new Set<string>()
  const repeated = new Set<string>()
  let isOver = false
  const writer = async (client: BedsideClient, number: number) => {
    for (let act = number; !isOver; act += 1) {
      const form = client.pressureForm(patientIds[act % patientIds.length] ?? '', 20 + (act % 11))
      while (!(await isAcknowledged(client, form))) {
        repeated.add(form.id)
        await pause(100)
      }
      acknowledged.add(form.id)
    }
  }
  const writers = clients.map(writer)
  return {
    acknowledged,
    repeated,
    async finish() {
      isOver = true
      await Promise.all(writers)
    },
  }
}

/** False when the server did not answer or could not; throws for an answer that sending again would not change. */
async function isAcknowledged(client: BedsideClient, form: ChartForm): Promise<boolean> {
  const answer = await client.send(form).catch(error => {
    if (error instanceof TypeError) return null // fetch: no connection, or one that broke
    throw error
  })
  if (answer === null || answer.status >= 500) return false
  if (acknowledges(answer, form)) return true
  throw new Error(`Form ${form.id} was answered ${answer.status}`)
}
