import { createHash } from 'node:crypto'
import { existsSync, readFileSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { must } from './command.mjs'
import { root, stateFolder } from './places.mjs'
import { secrets } from './secrets.mjs'

const stamp = join(stateFolder, 'demo')

/** The password of the demo's people: the one asked for, else a generated one. */
export const demoPassword = () => process.env.DEMO_PASSWORD || secrets().demo

/** Puts the demo into an empty database; into one that has it only the passwords. */
export async function seedDemo(env) {
  await must('The demo could not be made.', [process.execPath, 'build/server/seed.js'], {
    env: { ...env, NODE_ENV: 'production' },
    log: 'seed',
  })
}

const loopback = /^(localhost|127\.\d+\.\d+\.\d+|\[::1\]|)$/

/** Whether people with a known password may go into this database: it is on this machine, or the password was asked for. */
export const mayHoldDemo = (url) => loopback.test(new URL(url).hostname) || Boolean(process.env.DEMO_PASSWORD)

/** Makes the demo in the private cluster, once, and again where its password changed; in another database at each start. */
export async function ensureDemo(env, ownCluster) {
  const given = createHash('sha256').update(env.DEMO_PASSWORD).digest('hex')
  if (ownCluster && existsSync(stamp) && readFileSync(stamp, 'utf8') === given) return 'present'
  await seedDemo(env)
  if (ownCluster) writeFileSync(stamp, given)
  return 'made'
}

/** The lines that tell how to sign in. */
export function signIns(password) {
  const { teams } = JSON.parse(readFileSync(join(root, 'seed/demo-people.json'), 'utf8'))
  const people = teams.flatMap((team) => team.people.map((person) => ({ ...person, team: team.name })))
  const width = Math.max(...people.map((person) => person.email.length))
  return people.map(({ email, role, team }) => `  ${email.padEnd(width)}  ${password}  ${role}, ${team}`)
}
