import type { Migration } from './migration.ts'

/** Every migration under its name, in the order in which they are applied. */
export const migrations: Record<string, Migration> = {}
