import { readFileSync } from 'node:fs'
import { join, resolve } from 'node:path'
import type { RouteConfigEntry } from '@react-router/dev/routes'
import routes from '~/routes'

const app = resolve(import.meta.dirname, '../../app')

export interface RouteOfApp {
  /** As an address has it: `/teams/:team/books/:book`. */
  pattern: string
  hasPage: boolean
  hasAction: boolean
}

const slashes = (...parts: (string | undefined)[]) => `/${parts.filter(Boolean).join('/')}`.replace(/\/+/g, '/')

function leavesOf(entries: readonly RouteConfigEntry[], above: string): RouteOfApp[] {
  return entries.flatMap((entry) => {
    const pattern = slashes(above, entry.path)
    if (entry.children?.length) return leavesOf(entry.children, pattern)
    const source = readFileSync(join(app, entry.file), 'utf8')
    return [
      {
        pattern,
        hasPage: /export default function/.test(source),
        hasAction: /export (async function|const) action\b/.test(source),
      },
    ]
  })
}

/** Every address of the app that a request can ask for, from its list of routes. */
export const routesOfApp: RouteOfApp[] = leavesOf(await routes, '')
