import type { Source } from './sources'

/** Tables that hold what a team says together: changed by operations alone. */
export const contentTables = [
  'books',
  'cards',
  'conditions',
  'corners',
  'landmarkPlacements',
  'landmarks',
  'layouts',
  'marks',
  'places',
  'stretches',
  'stretchPlacements',
  'ties',
]

/** Commands that make a scope, empty: nobody has said anything of it yet. */
const makers = ['app/db/books.server.ts insert books', 'app/db/circuits.server.ts insert layouts']

const inSql = (table: string) => table.replace(/[A-Z]/g, (letter) => `_${letter.toLowerCase()}`)
const tableInSql = new Map(contentTables.map((table) => [inSql(table), table]))

/** Other names of tables in a file: `import { marks as table }`, `const table = schema.marks`. */
function aliases(text: string): Map<string, string> {
  const imported = text.matchAll(/\b(\w+)\s+as\s+(\w+)/g)
  const assigned = text.matchAll(/\b(?:const|let)\s+(\w+)\s*=\s*(?:\w+\.)?(\w+)\s*(?:;|\n|$)/g)
  return new Map([
    ...[...imported].map(([, table, name]) => [name!, table!] as const),
    ...[...assigned].map(([, name, table]) => [name!, table!] as const),
  ])
}

/** Writes to a scope's content outside the one write path. */
export function strayWrites({ path, text }: Source): string[] {
  if (!path.startsWith('app/') || path.startsWith('app/db/apply/') || path === 'app/db/apply.server.ts') return []
  const known = aliases(text)
  const built = [...text.matchAll(/\.(insert|update|delete)\(\s*(?:\w+\.)?(\w+)\s*\)/g)].map(([, verb, name]) => ({
    verb: verb!,
    table: known.get(name!) ?? name!,
  }))
  const written = [...text.matchAll(/\b(insert\s+into|update|delete\s+from)\s+(?:only\s+)?"?(\w+)"?/gi)].map(
    ([, verb, name]) => ({
      verb: verb!.split(/\s/)[0]!.toLowerCase(),
      table: tableInSql.get(name!.toLowerCase()) ?? '',
    }),
  )
  return [...built, ...written]
    .filter(({ verb, table }) => contentTables.includes(table) && !makers.includes(`${path} ${verb} ${table}`))
    .map(({ table }) => `${path} writes ${table}: only app/db/apply may`)
}
