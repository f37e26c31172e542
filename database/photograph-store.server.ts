import { mkdir, open, readdir, readFile, rename, rm, stat } from 'node:fs/promises'
import { join } from 'node:path'
import { env } from '#app/env.server.ts'

/** Where pictures are kept. A folder here; an object store has the same four verbs. Names are made by us alone. */
export interface PhotographStore {
  /** Keeps a picture, all of it or nothing; it is there after a loss of power. */
  write(name: string, bytes: Uint8Array): Promise<void>
  /** The picture, or undefined when there is none of that name. */
  read(name: string): Promise<Buffer | undefined>
  /** Removes a picture; one that is not there is no mistake. */
  remove(name: string): Promise<void>
  /** Every name with the moment at which it was written. */
  list(): Promise<readonly { readonly name: string; readonly writtenAt: Date }[]>
}

const NAME = /^[0-9a-f]{8}(-[0-9a-f]{4}){3}-[0-9a-f]{12}(-small)?\.webp$/

/** A store in a folder, made when first needed. Throws RangeError for a name that was not made here. */
export function folderStore(folder: string): PhotographStore {
  const pathOf = (name: string): string => {
    if (!NAME.test(name)) throw new RangeError('This is no name of a photograph')
    return join(folder, name)
  }
  return {
    async write(name, bytes) {
      const path = pathOf(name)
      await mkdir(folder, { recursive: true, mode: 0o700 })
      const part = `${path}.part`
      const file = await open(part, 'w', 0o600)
      try {
        await file.writeFile(bytes)
        await file.sync()
      } finally {
        await file.close()
      }
      await rename(part, path)
    },
    read: name => readFile(pathOf(name)).catch(whenMissing(undefined)),
    remove: name => rm(pathOf(name), { force: true }),
    async list() {
      const names = (await readdir(folder).catch(whenMissing([]))).filter(name =>
        NAME.test(name.replace(/\.part$/, '')),
      )
      const files = await Promise.all(
        names.map(async name => {
          const found = await stat(join(folder, name)).catch(whenMissing(undefined))
          return found ? [{ name: name.replace(/\.part$/, ''), writtenAt: found.mtime }] : []
        }),
      )
      return files.flat()
    },
  }
}

function whenMissing<T>(instead: T) {
  return (error: NodeJS.ErrnoException): T => {
    if (error.code === 'ENOENT') return instead
    throw error
  }
}

/** The store of this installation. */
export const photographStore: PhotographStore = folderStore(join(env.dataFolder, 'photographs'))
