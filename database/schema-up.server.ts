import type { Sequelize } from 'sequelize'
import { grantAppRights } from './grants.server.ts'
import { migrateUp } from './migrate.server.ts'

/** Brings the schema up to date with the rights of the application's own user, and says in a few words what that took. */
export async function schemaUp(owner: Sequelize, appUrl: string): Promise<string> {
  const applied = await migrateUp(owner)
  await grantAppRights(owner, appUrl)
  return applied.length > 0 ? `applied ${counted(applied)}` : 'up to date'
}

/** `3 migrations, the last is 0003-ward-members` */
export function counted(names: readonly string[]): string {
  return `${names.length === 1 ? 'one migration' : `${names.length} migrations, the last is`} ${names.at(-1)}`
}
