import { existsSync, readFileSync } from 'node:fs'
import { join } from 'node:path'
import { ROOT, tool } from './tool.mjs'

/**
 * Installs the packages of the lock file unless just those are installed. Answers what was done.
 * @param {AbortSignal} [signal]
 */
export async function dependencies(signal) {
  if (areInstalled()) return 'in place'
  // Named, because NODE_ENV=production would leave out what the build needs.
  await tool(['npm', 'ci', '--include=dev'], { signal, advice: 'Is there a way to the npm registry? Try: npm ci' })
  return 'installed'
}

function areInstalled() {
  const installed = join(ROOT, 'node_modules/.package-lock.json') // npm's own note of what it installed
  if (!existsSync(installed)) return false
  const present = packagesOf(installed)
  // A package for another platform is optional, and absent with good reason.
  return Object.entries(packagesOf(join(ROOT, 'package-lock.json'))).every(
    ([path, { version, optional }]) => path === '' || (present[path] ? present[path].version === version : optional),
  )
}

/**
 * @param {string} file
 * @returns {Record<string, { version?: string, optional?: boolean }>}
 */
function packagesOf(file) {
  return JSON.parse(readFileSync(file, 'utf8')).packages
}
