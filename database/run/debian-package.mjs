import { spawnSync } from 'node:child_process'
import { existsSync } from 'node:fs'

const POLICY = '/usr/sbin/policy-rc.d'

/**
 * Installs a Debian package unless the program it brings is there. Starts no system service, whatever the package
 * asks for. Throws with the command to type when the package cannot be installed from here.
 * @param {{ name: string, program: string }} debianPackage
 * @returns {boolean} true when it had to be installed
 */
export function installed({ name, program }) {
  if (existsSync(program)) return false
  const byHand = `Install it by hand: sudo apt-get install ${name}`
  if (!existsSync('/usr/bin/apt-get')) throw new Error(`${program} is missing, and this system has no apt. ${byHand}`)
  const prefix = process.getuid?.() === 0 ? [] : ['sudo', '-n']
  const root = asRoot(prefix)
  const ownPolicy = !existsSync(POLICY)
  if (ownPolicy) root(['sh', '-c', `printf '#!/bin/sh\\nexit 101\\n' > ${POLICY} && chmod 755 ${POLICY}`])
  try {
    const apt = ['env', 'DEBIAN_FRONTEND=noninteractive', 'apt-get', '-q', '-o', 'DPkg::Lock::Timeout=300']
    const install = [...apt, 'install', '-y', '--no-install-recommends', name]
    // The lists may be missing or old: they are fetched only when the first try fails.
    if (!root(install).ok) root([...apt, 'update'])
    const last = existsSync(program) ? { ok: true, says: '' } : root(install)
    if (!last.ok) throw new Error(`apt-get could not install ${name}:\n${last.says}\n${byHand}`)
  } finally {
    if (ownPolicy) root(['rm', '-f', POLICY])
  }
  return true
}

/** @param {string[]} prefix */
function asRoot(prefix) {
  /** @param {string[]} command */
  return command => {
    const [program = '', ...rest] = [...prefix, ...command]
    const done = spawnSync(program, rest, { encoding: 'utf8', stdio: ['ignore', 'pipe', 'pipe'] })
    const says = (done.error?.message ?? done.stderr ?? '').trim().split('\n').slice(-5).join('\n')
    return { ok: done.status === 0, says }
  }
}

export const MARIADB = { name: 'mariadb-server', program: '/usr/sbin/mariadbd' }
export const CHROMIUM = { name: 'chromium', program: '/usr/bin/chromium' }
