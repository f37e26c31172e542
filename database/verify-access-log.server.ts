import { createHash } from 'node:crypto'
import { type AccessRow, accessColumns, GENESIS, linkHash } from './access-log.server.ts'
import { select } from './sequelize.server.ts'

/** The first link that is not as it was written, and what is wrong with it. */
export type BadLink = { readonly chain: string; readonly seq: number; readonly says: string }

/**
 * What a check of the whole log found. `digest` stands for the last link of every chain: kept somewhere else, it shows
 * later whether the end of a chain was cut off together with its head, which nothing in the database can show.
 */
export type AccessLogVerdict = {
  readonly chains: number
  readonly links: number
  readonly firstBad: BadLink | null
  readonly digest: string
}

type Head = { chain: string; seq: number; hash: string }

const ROWS_AT_ONCE = 2000

/** Computes every link of the access log again, chain by chain, and compares the end of each with its head. */
export async function verifyAccessLog(): Promise<AccessLogVerdict> {
  const heads = await select<Head>('SELECT chain, seq, hash FROM access_log_heads ORDER BY chain')
  const digest = createHash('sha256')
  for (const { chain, seq, hash } of heads) digest.update(`${chain} ${seq} ${hash}\n`)
  const walked = new Map<string, Head>()
  let links = 0
  for await (const row of allRows()) {
    const before = walked.get(row.chain) ?? { chain: row.chain, seq: 0, hash: GENESIS }
    const says = faultOf(row, before)
    if (says !== null) return verdict({ chain: row.chain, seq: row.seq, says })
    walked.set(row.chain, { chain: row.chain, seq: row.seq, hash: row.hash })
    links += 1
  }
  return verdict(badHead(heads, walked))

  function verdict(firstBad: BadLink | null): AccessLogVerdict {
    return { chains: heads.length, links, firstBad, digest: digest.digest('hex') }
  }
}

async function* allRows(): AsyncGenerator<AccessRow> {
  let after = { chain: '', seq: 0 }
  for (;;) {
    const rows = await select<AccessRow>(
      `SELECT ${accessColumns} FROM access_log WHERE chain > :chain OR (chain = :chain AND seq > :seq)
       ORDER BY chain, seq LIMIT ${ROWS_AT_ONCE}`,
      after,
    )
    yield* rows
    const last = rows.at(-1)
    if (last === undefined) return
    after = { chain: last.chain, seq: last.seq }
  }
}

function faultOf(row: AccessRow, before: Head): string | null {
  if (row.seq !== before.seq + 1) return `follows ${before.seq}: what was between them is gone`
  if (row.prevHash !== before.hash) return 'is not tied to the link before it'
  return linkHash(row) === row.hash ? null : 'is not as it was written'
}

/** An end that does not fit its head: links were cut off the end, or added without going through the application. */
function badHead(heads: readonly Head[], walked: ReadonlyMap<string, Head>): BadLink | null {
  const known = new Set(heads.map(({ chain }) => chain))
  for (const { chain, seq } of walked.values()) if (!known.has(chain)) return { chain, seq, says: 'has no head' }
  for (const head of heads) {
    const end = walked.get(head.chain) ?? { seq: 0, hash: GENESIS }
    if (end.seq < head.seq) return { chain: head.chain, seq: head.seq, says: `is gone: the chain ends at ${end.seq}` }
    if (end.seq > head.seq || end.hash !== head.hash)
      return { chain: head.chain, seq: end.seq, says: `is not the end that was written, which is ${head.seq}` }
  }
  return null
}
