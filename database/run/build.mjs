import { createHash } from 'node:crypto'
import { existsSync, mkdirSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { locked } from './lock.mjs'
import { ROOT, tool } from './tool.mjs'

const SOURCES = [
  ...['app', 'database', 'public', 'tailwind.css', 'vite.config.ts', 'react-router.config.ts', 'tsconfig.json'],
  ...['package.json', 'package-lock.json'],
]

/**
 * Builds the application into build/ unless the build there was made from just these sources. Answers what was done.
 * @param {AbortSignal} [signal]
 */
export async function built(signal) {
  const folder = join(ROOT, 'build')
  const stamp = join(folder, 'made-from')
  mkdirSync(folder, { recursive: true })
  return locked(join(folder, 'lock'), async () => {
    const sources = sourceHash()
    if (existsSync(stamp) && readFileSync(stamp, 'utf8') === sources) return 'up to date'
    rmSync(stamp, { force: true })
    await tool(['node', 'node_modules/@react-router/dev/bin.js', 'build'], { env: { NODE_ENV: 'production' }, signal })
    writeFileSync(stamp, sources)
    return 'made'
  })
}

function sourceHash() {
  const hash = createHash('sha256')
  for (const file of SOURCES.flatMap(filesBelow))
    hash
      .update(`${file}\0`)
      .update(readFileSync(join(ROOT, file)))
      .update('\0')
  return hash.digest('hex')
}

/**
 * @param {string} source a file or folder of the project
 * @returns {string[]}
 */
function filesBelow(source) {
  const entries = existsSync(join(ROOT, source)) ? [source] : []
  return entries.flatMap(path => {
    if (path.includes('.') && !path.includes('/')) return [path]
    return readdirSync(join(ROOT, path), { recursive: true, withFileTypes: true })
      .filter(entry => entry.isFile() && !/\.test\.tsx?$/.test(entry.name))
      .map(entry => join(entry.parentPath, entry.name).slice(ROOT.length))
      .sort()
  })
}
