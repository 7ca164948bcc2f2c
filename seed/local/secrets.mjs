import { randomBytes } from 'node:crypto'
import { existsSync, readFileSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { localFolder } from './places.mjs'

const file = join(localFolder, 'secrets.json')

/** A password that needs no escape in an address. */
export const newPassword = (bytes = 18) => randomBytes(bytes).toString('base64url')

/** Generated passwords of this checkout: made at the first start, the same ever after. */
export function secrets() {
  const stored = existsSync(file) ? JSON.parse(readFileSync(file, 'utf8')) : {}
  const all = { owner: newPassword(), app: newPassword(), demo: newPassword(9), ...stored }
  if (Object.keys(all).length !== Object.keys(stored).length) {
    writeFileSync(file, `${JSON.stringify(all, null, 2)}\n`, { mode: 0o600 })
  }
  return all
}
