import { QueryTypes, type Sequelize } from 'sequelize'

/** The schema of a migrated database as SQL: every table, then every trigger, by name, so that two dumps compare. */
export async function schemaOf(owner: Sequelize): Promise<string> {
  const tables = await owner.query<{ name: string }>(
    'SELECT table_name AS name FROM information_schema.tables WHERE table_schema = DATABASE() ORDER BY table_name',
    { type: QueryTypes.SELECT },
  )
  const triggers = await owner.query<{ name: string }>(
    'SELECT trigger_name AS name FROM information_schema.triggers WHERE trigger_schema = DATABASE() ORDER BY trigger_name',
    { type: QueryTypes.SELECT },
  )
  const statements: string[] = []
  for (const { name } of tables) statements.push(await shown(owner, 'TABLE', name))
  for (const { name } of triggers) statements.push(await shown(owner, 'TRIGGER', name))
  return `${statements.join('\n\n')}\n`
}

async function shown(owner: Sequelize, kind: 'TABLE' | 'TRIGGER', name: string) {
  const [row] = await owner.query<Record<string, unknown>>(`SHOW CREATE ${kind} \`${name}\``, {
    type: QueryTypes.SELECT,
  })
  const statement = String(row?.['Create Table'] ?? row?.['Create View'] ?? row?.['SQL Original Statement'])
  // Who made it and how far a counter has come say nothing about the schema.
  return `${statement.replace(/ DEFINER=\S+/, '').replace(/ AUTO_INCREMENT=\d+/, '')};`
}
