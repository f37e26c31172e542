import type { Alongside } from './entries.server.ts'
import { type PhotographStore, photographStore } from './photograph-store.server.ts'
import { change, select } from './sequelize.server.ts'

/** A photograph that is to become part of an entry: re-encoded, large and small. `id` is that of entry and content. */
export interface NewPhotograph {
  readonly id: string
  /** The name of its files, made for this one sending. */
  readonly file: string
  readonly large: Uint8Array
  readonly small: Uint8Array
  readonly width: number
  readonly height: number
  readonly sha256: string
}

/** A photograph on record, and whose it is. */
export type StoredPhotograph = {
  readonly id: string
  readonly file: string
  readonly entryId: string
  readonly stayId: string
  readonly patientId: string
  readonly width: number
  readonly height: number
}

/** The names of a photograph's two files in the store. */
export function fileNames(file: string): { readonly large: string; readonly small: string } {
  return { large: `${file}.webp`, small: `${file}-small.webp` }
}

/** Writes the rows of an entry's photographs in its transaction. */
export function photographsAlongside(
  entry: { id: string; stayId: string },
  added: readonly NewPhotograph[],
): Alongside {
  return async transaction => {
    for (const { id, file, large, width, height, sha256 } of added) {
      await change(
        `INSERT INTO photographs (id, entry_id, stay_id, file, width, height, bytes, sha256)
         VALUES (:id, :entryId, :stayId, :file, :width, :height, :bytes, :sha256)`,
        { id, entryId: entry.id, stayId: entry.stayId, file, width, height, bytes: large.byteLength, sha256 },
        transaction,
      )
    }
  }
}

/** Puts the files of photographs into the store, before the entry that makes them part of the record. */
export async function writeFiles(added: readonly NewPhotograph[], store = photographStore): Promise<void> {
  try {
    for (const { file, large, small } of added) {
      const names = fileNames(file)
      await store.write(names.large, large)
      await store.write(names.small, small)
    }
  } catch (error) {
    await removeFiles(added, store)
    throw error
  }
}

/** Takes the files out again, of an entry that was not charted. */
export async function removeFiles(
  added: readonly Pick<NewPhotograph, 'file'>[],
  store = photographStore,
): Promise<void> {
  for (const { file } of added) for (const name of Object.values(fileNames(file))) await store.remove(name)
}

/** One photograph on record; undefined when there is none. */
export async function photographById(id: string): Promise<StoredPhotograph | undefined> {
  const [row] = await select<StoredPhotograph>(
    `SELECT p.id, p.file, p.entry_id AS entryId, p.stay_id AS stayId, s.patient_id AS patientId, p.width, p.height
     FROM photographs p JOIN stays s ON s.id = p.stay_id WHERE p.id = :id`,
    { id },
  )
  return row
}

/**
 * Removes files that no row names and that are older than an hour: of entries that were refused while a process ended.
 * Gives how many.
 */
export async function sweepFiles(now: Date, store: PhotographStore = photographStore): Promise<number> {
  const old = (await store.list()).filter(({ writtenAt }) => now.getTime() - writtenAt.getTime() > HOUR_MS)
  if (old.length === 0) return 0
  const rows = await select<{ file: string }>('SELECT file FROM photographs')
  const known = new Set(rows.flatMap(({ file }) => Object.values(fileNames(file))))
  const orphans = old.filter(({ name }) => !known.has(name))
  for (const { name } of orphans) await store.remove(name)
  return orphans.length
}

const HOUR_MS = 3_600_000
