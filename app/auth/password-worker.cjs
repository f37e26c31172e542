// A worker thread, because argon2-browser is made for browsers: on Node 20 it takes `fetch` for its wasm and ends the process,
// unless the wasm is handed over first; and one hash takes about 50 ms, which would hold up every other request.
const { readFileSync } = require('node:fs')

Object.assign(globalThis, {
  self: globalThis,
  Module: { wasmBinary: readFileSync(require.resolve('argon2-browser/dist/argon2-simd.wasm')) },
})

/** @type {typeof import('argon2-browser')} */
const argon2 = require('argon2-browser')

const WRONG_PASSWORD = -35

/**
 * @param {{ password: string, salt: Uint8Array, memoryKib: number, passes: number }} task
 * @returns {Promise<string>} the hash in its encoded form, `$argon2id$v=19$...`
 */
async function hash({ password, salt, memoryKib, passes }) {
  const made = await argon2.hash({
    pass: password,
    salt,
    mem: memoryKib,
    time: passes,
    parallelism: 1,
    hashLen: 32,
    type: argon2.ArgonType.Argon2id,
  })
  return made.encoded
}

/**
 * @param {{ password: string, encoded: string }} task
 * @returns {Promise<boolean>}
 */
async function matches({ password, encoded }) {
  try {
    await argon2.verify({ pass: password, encoded, type: argon2.ArgonType.Argon2id })
    return true
  } catch (error) {
    const { code, message } = /** @type {import('argon2-browser').Argon2Error} */ (error)
    if (code === WRONG_PASSWORD) return false
    throw new Error(`argon2 could not read a stored hash: ${message} (${code})`)
  }
}

module.exports = { hash, matches }
