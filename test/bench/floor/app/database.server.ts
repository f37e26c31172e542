import { QueryTypes } from 'sequelize'
import { connection } from '#database/connection.server.ts'

// The application's own pool, with its settings.
const pool = connection(process.env.DATABASE_URL ?? '')

export async function one(): Promise<number> {
  const [row] = await pool.query<{ one: number }>('SELECT 1 AS one', { type: QueryTypes.SELECT })
  return row?.one ?? 0
}

export async function insert(id: string, data: string): Promise<void> {
  const replacements = { id, data }
  await pool.query('INSERT INTO floor_rows (id, data) VALUES (:id, :data)', { type: QueryTypes.INSERT, replacements })
}
