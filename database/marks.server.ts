import { select } from './sequelize.server.ts'

/** What changes with every policy, and with every decision about a lot or new name of a line: whoever keeps them in memory asks for it first. */
export interface Marks {
  readonly policies: string
  readonly lots: string
}

let asking: Promise<Marks> | null = null

/** The marks as they are now. All who ask in one turn of the program share one query, which is sent after the last of them asked. */
export function marks(): Promise<Marks> {
  asking ??= Promise.resolve().then(() => {
    asking = null
    return read()
  })
  return asking
}

async function read(): Promise<Marks> {
  const [found] = await select<Marks>(
    `SELECT
       (SELECT CONCAT_WS(' ', COUNT(*), MAX(created_at), (SELECT COUNT(*) FROM policy_withdrawals)) FROM policies) AS policies,
       (SELECT CONCAT_WS(' ', COUNT(*), MAX(number), (SELECT SUM(JSON_LENGTH(former_names)) FROM tube_lines)) FROM lot_recalls) AS lots`,
  )
  if (!found) throw new Error('A SELECT without FROM has one row')
  return found
}
