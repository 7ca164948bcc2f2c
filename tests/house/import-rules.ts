import { builtinModules } from 'node:module'
import type { Import } from './imports'

/** Folders of `app` without clock, chance, network or screen, in the order in which they may import each other. */
export const pureFolders = ['app/track', 'app/car', 'app/book', 'app/draw', 'app/words']

/** Packages that pure folders may use; all of them compute, none reaches outside. */
const purePackages =
  /^(zod\/mini|@turf\/.+|flatbush|saxes|csv-parse(\/.+)?|suncalc|ts-fsrs|d3-scale|d3-shape|geojson|fractional-indexing|temporal-polyfill)$/

/** What each pure folder may import of the app; a folder may always import itself. */
const pureOrder: Record<string, string[]> = {
  'app/track': [],
  'app/car': ['app/track'],
  'app/book': ['app/track', 'app/car'],
  'app/draw': ['app/track', 'app/car', 'app/book'],
  'app/words': ['app/track', 'app/car', 'app/book', 'app/draw'],
}

/** Packages with one home. */
const homes: { packages: RegExp; folders: string[] }[] = [
  { packages: /^(leaflet|react-leaflet|@react-leaflet\/.+)(\/.+)?$/, folders: ['app/map'] },
  { packages: /^(drizzle-orm|pg|pg-boss|drizzle-kit)(\/.+)?$/, folders: ['app/db', 'seed', 'tests'] },
  { packages: /^(lucia|arctic|@lucia-auth\/.+|@node-rs\/argon2)$/, folders: ['app/auth', 'tests'] },
  { packages: /^(idb|workbox-.+)$/, folders: ['app/offline'] },
  {
    packages: /^(express|compression|@react-router\/express)$/,
    folders: ['app/middleware', 'app/server.ts', 'app/listen.server.ts'],
  },
  {
    packages: /^node:(fs|child_process|net|http|https)(\/.+)?$/,
    folders: ['app/db', 'app/services', 'app/middleware', 'app/server.ts', 'app/listen.server.ts', 'seed', 'tests'],
  },
]

/** What each folder of the app must not import of the app. */
const forbidden: { in: string; of: RegExp; why: string }[] = [
  {
    in: 'app/components',
    of: /^app\/(db|auth|routes|services|middleware|env\.server|log\.server)/,
    why: 'a component gets props',
  },
  { in: 'app/map', of: /^app\/(db|auth|routes|services|middleware|env\.server|log\.server)/, why: 'a map gets props' },
  { in: 'app/routes', of: /^app\/db\/(schema|client)/, why: 'a route calls what reads and writes' },
  { in: 'app/db', of: /^app\/(auth|routes|components|map|middleware|draw|words)/, why: 'rows know nothing of pages' },
  { in: 'app/auth', of: /^app\/(routes|components|map|draw)/, why: 'sign-in knows nothing of pages' },
]

const within = (path: string, folder: string) => path === folder || path.startsWith(`${folder}/`)
const packageName = (specifier: string) => (builtinModules.includes(specifier) ? `node:${specifier}` : specifier)
const isOwn = (target: string) => /^(app|seed|tests)\//.test(target)

/** The pure folder of a module. The renderers in `draw/svg` and `draw/pdf` are elements, not display lists: they are in none. */
function pureFolderOf(path: string): string | undefined {
  if (/^app\/draw\/(svg|pdf)\//.test(path)) return undefined
  return pureFolders.find((folder) => within(path, folder))
}

function pureProblem(path: string, { target }: Import): string | undefined {
  const folder = pureFolderOf(path)
  if (!folder) return undefined
  if (!isOwn(target)) return purePackages.test(packageName(target)) ? undefined : `${folder} is pure and may not use it`
  const allowed = [folder, ...(pureOrder[folder] ?? [])]
  const renderer = folder === 'app/draw' && /^app\/draw\/(svg|pdf)\//.test(target)
  return !renderer && allowed.some((other) => within(target, other))
    ? undefined
    : `${folder} may import ${allowed.join(', ')}`
}

function homeProblem(path: string, { target }: Import): string | undefined {
  const home = homes.find(({ packages }) => packages.test(packageName(target)))
  if (!home || home.folders.some((folder) => within(path, folder))) return undefined
  return `only ${home.folders.join(', ')} may`
}

function folderProblem(path: string, { target, lazy, typesOnly }: Import): string | undefined {
  if (within(path, 'app') && /^(tests|seed)\//.test(target)) return 'the app does not lean on tests or seed'
  if (within(target, 'app/map') && !within(path, 'app/map') && !lazy && !typesOnly) return 'the map is loaded lazily'
  const generated = /\/\+types\//.test(target)
  if (within(path, 'app/routes') && within(target, 'app/routes') && !typesOnly && !generated) {
    return 'what two routes share lives elsewhere'
  }
  return forbidden.find((rule) => within(path, rule.in) && rule.of.test(target))?.why
}

function pathProblem(path: string, { specifier, target }: Import): string | undefined {
  if (!specifier.startsWith('..') || !within(path, 'app') || /\/\+types\//.test(target)) return undefined
  const folder = path.split('/').slice(0, 2).join('/')
  return within(target, folder) ? undefined : 'another folder is imported by its name, ~/…'
}

/**
 * What is wrong with an import, or nothing.
 *
 * @param path of the importing module, from the checkout
 */
export function importProblem(path: string, what: Import): string | undefined {
  for (const rule of [pureProblem, homeProblem, folderProblem, pathProblem]) {
    const problem = rule(path, what)
    if (problem) return `${path} imports ${what.specifier}: ${problem}`
  }
  return undefined
}
