import { existsSync, readdirSync } from 'node:fs'
import { join } from 'node:path'

const folder = '/usr/lib/postgresql'

/** Folder of the programs of one installed version, `15` for instance; undefined where it is not installed. */
export function programsOf(version) {
  const bin = join(folder, version, 'bin')
  return ['initdb', 'pg_ctl', 'postgres', 'psql'].every((name) => existsSync(join(bin, name))) ? bin : undefined
}

/** The newest installed version of PostgreSQL, or undefined. */
export function newestVersion() {
  if (!existsSync(folder)) return undefined
  const versions = readdirSync(folder).filter((name) => /^\d+$/.test(name) && programsOf(name))
  return versions.sort((a, b) => Number(b) - Number(a))[0]
}
