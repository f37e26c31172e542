import { v7 as uuidv7 } from 'uuid'
import { suction } from '#app/care/suction/kind.ts'
import { typedFrom } from '#app/charting/chart-form.ts'
import { connection } from '#database/connection.server.ts'
import { catalogueComparisons } from './catalogue-figures.ts'
import type { FilledDatabase } from './databases.ts'
import { type Answer, type Ask, ask } from './requests.ts'
import type { Served } from './servers.ts'

/** A server, and the requests that are sent to it one after the other. */
export interface Side {
  readonly server: Served
  /** Anew for each round. */
  readonly begin: () => Promise<() => Ask | Promise<Ask>>
  readonly status: number
  /** In each round. */
  readonly requests: number
}

/** One request of the application against what it is measured by. */
export interface Comparison {
  readonly name: string
  readonly target: number
  readonly ours: Side
  readonly floor: Side
}

/** What is measured on: the application on a large and on a small database, and the bare routes. */
export interface Setting {
  readonly large: FilledDatabase
  readonly small: FilledDatabase
  readonly application: Served
  readonly applicationOnSmall: Served
  readonly bare: Served
}

/** Every comparison, those that add entries last. */
export function comparisons({ large, small, application, applicationOnSmall, bare }: Setting): readonly Comparison[] {
  const page = boardPage(application, large)
  const bareData: Side = { server: bare, status: 200, requests: 80, begin: always({ path: '/data' }) }
  return [
    {
      name: 'Ward board as a page',
      target: 4,
      ours: page,
      floor: { server: bare, status: 200, requests: 40, begin: always({ path: '/' }) },
    },
    { name: 'Refresh of its data', target: 2.5, ours: boardData(application, large), floor: bareData },
    { name: 'Refresh when unchanged (304)', target: 1, ours: unchanged(application, large), floor: bareData },
    { name: 'Board, 1.5 M entries against 10 k', target: 1.2, ours: page, floor: boardPage(applicationOnSmall, small) },
    ...catalogueComparisons({ large, small, application, applicationOnSmall, bare }),
    {
      name: 'The same, each after an entry',
      target: 1.2,
      ours: changedPage(application, large),
      floor: changedPage(applicationOnSmall, small),
    },
    {
      name: 'Charting one entry',
      target: 2,
      ours: { server: application, status: 302, requests: 20, begin: async () => () => chartForm(application, large) },
      floor: { server: bare, status: 302, requests: 40, begin: async () => () => bareForm(bare, large) },
    },
  ]
}

/** The page of the first ward, as a nurse of it asks for it. */
export function boardPage(server: Served, { cookie, wardId }: FilledDatabase): Side {
  const headers = { Cookie: cookie, Accept: 'text/html' }
  return { server, status: 200, requests: 20, begin: always({ path: `/wards/${wardId}/board`, headers }) }
}

function boardData(server: Served, { cookie, wardId }: FilledDatabase): Side {
  return {
    server,
    status: 200,
    requests: 40,
    begin: always({ path: `/api/wards/${wardId}/board`, headers: { Cookie: cookie } }),
  }
}

/** With the tag that the board had in the last answer: it changes every five minutes. */
function unchanged(server: Served, { cookie, wardId }: FilledDatabase): Side {
  const path = `/api/wards/${wardId}/board`
  let tag = ''
  const answered = ({ headers }: Answer) => {
    tag = headers.etag ?? tag
  }
  const next = () => ({ path, headers: { Cookie: cookie, 'If-None-Match': tag }, answered })
  const begin = async () => {
    answered(await ask(server.port, next()))
    return next
  }
  return { server, status: 304, requests: 80, begin }
}

/** A page that cannot be the one before: somebody has charted on the ward meanwhile. */
function changedPage(server: Served, database: FilledDatabase): Side {
  const page = boardPage(server, database)
  const pool = connection(database.appUrl, { maxConnections: 4 })
  const begin = async () => {
    const next = await page.begin()
    return async () => {
      await pool.query(
        `INSERT INTO entries (id, stay_id, kind, version, performed_at, recorded_by, recorded_role, data)
         VALUES (:id, :stayId, :kind, 1, UTC_TIMESTAMP(3), :nurseId, 'nurse', :data)`,
        { replacements: { id: uuidv7(), stayId: inTurn(database.stays).id, nurseId: database.nurseId, ...act } },
      )
      return next()
    }
  }
  return { ...page, requests: 12, begin }
}

const example = suction.examples[0]
const act = { kind: suction.slug, data: JSON.stringify(example) }

function chartForm({ port }: Served, { cookie, stays, nurseId }: FilledDatabase): Ask {
  const headers = { Cookie: cookie, Accept: 'text/html', Origin: `http://127.0.0.1:${port}` }
  return { path: `/patients/${inTurn(stays).patientId}/chart/${suction.slug}`, headers, form: filled(nurseId) }
}

function bareForm({ port }: Served, { nurseId }: FilledDatabase): Ask {
  return { path: '/insert', headers: { Origin: `http://127.0.0.1:${port}` }, form: filled(nurseId) }
}

/** A form that a nurse has just opened and filled in. */
function filled(nurseId: string): URLSearchParams {
  const spine = { id: uuidv7(), openedBy: nurseId, at: new Date().toISOString(), when: 'now', intent: 'chart' }
  const form = new URLSearchParams(spine)
  for (const [name, values] of Object.entries(typedFrom({ ...example }))) {
    for (const value of values) form.append(name, value)
  }
  return form
}

let turn = 0

function inTurn(stays: FilledDatabase['stays']) {
  turn += 1
  const stay = stays[turn % stays.length]
  if (!stay) throw new RangeError('A ward has patients')
  return stay
}

const always = (request: Ask) => async () => () => request
