import type { Source } from './sources'

/** Tables that hold what a team says together: changed by operations alone. */
export const contentTables = [
  'cards',
  'conditions',
  'corners',
  'landmarkPlacements',
  'landmarks',
  'marks',
  'places',
  'stretches',
  'stretchPlacements',
  'ties',
]

/** Writes to a scope's content outside the one write path. */
export function strayWrites({ path, text }: Source): string[] {
  if (!path.startsWith('app/') || path.startsWith('app/db/apply/') || path === 'app/db/apply.server.ts') return []
  const writes = text.matchAll(/\.(?:insert|update|delete)\(\s*(?:\w+\.)?(\w+)\s*\)/g)
  const tables = [...writes].map(([, table]) => table!).filter((table) => contentTables.includes(table))
  return tables.map((table) => `${path} writes ${table}: only app/db/apply may`)
}
