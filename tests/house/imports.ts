import { posix } from 'node:path'
import ts from 'typescript'
import type { Source } from './sources'

export type Import = {
  /** What is written between the quotes. */
  specifier: string
  /** Path of the module from the checkout without its extension (`app/track/plane`), or the package's specifier. */
  target: string
  /** Written as `import()`, so that it is loaded only when reached. */
  lazy: boolean
  /** Brings types alone; nothing of it is left when the program runs. */
  typesOnly: boolean
}

const aliases: [prefix: string, folder: string][] = [
  ['~/', 'app/'],
  ['seed/', 'seed/'],
]

function targetOf(specifier: string, path: string): string {
  const bare = specifier.replace(/\?.*$/, '').replace(/\.(tsx?|mjs)$/, '')
  if (bare.startsWith('.')) return posix.join(posix.dirname(path), bare)
  const alias = aliases.find(([prefix]) => bare.startsWith(prefix))
  return alias ? alias[1] + bare.slice(alias[0].length) : bare
}

function importIn(
  node: ts.Node,
): { specifier: ts.Expression | undefined; lazy: boolean; typesOnly: boolean } | undefined {
  if (ts.isImportDeclaration(node)) {
    const typesOnly = node.importClause?.isTypeOnly ?? false
    return { specifier: node.moduleSpecifier, lazy: false, typesOnly }
  }
  if (ts.isExportDeclaration(node)) return { specifier: node.moduleSpecifier, lazy: false, typesOnly: node.isTypeOnly }
  if (ts.isCallExpression(node) && node.expression.kind === ts.SyntaxKind.ImportKeyword) {
    return { specifier: node.arguments[0], lazy: true, typesOnly: false }
  }
  if (ts.isImportTypeNode(node) && ts.isLiteralTypeNode(node.argument)) {
    return { specifier: node.argument.literal as ts.StringLiteral, lazy: false, typesOnly: true }
  }
  return undefined
}

/** Everything that a module imports or exports on. */
export function importsOf({ path, text }: Source): Import[] {
  const found: Import[] = []
  const visit = (node: ts.Node) => {
    const seen = importIn(node)
    if (seen?.specifier && ts.isStringLiteralLike(seen.specifier)) {
      const specifier = seen.specifier.text
      found.push({ specifier, target: targetOf(specifier, path), lazy: seen.lazy, typesOnly: seen.typesOnly })
    }
    ts.forEachChild(node, visit)
  }
  const kind = path.endsWith('x') ? ts.ScriptKind.TSX : ts.ScriptKind.TS
  visit(ts.createSourceFile(path, text, ts.ScriptTarget.Latest, true, kind))
  return found
}
