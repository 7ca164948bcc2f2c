import ts from 'typescript'
import type { Source } from './sources'

/** The order in which a route module tells what it is. */
export const exportOrder = [
  'meta',
  'links',
  'handle',
  'middleware',
  'loader',
  'action',
  'clientLoader',
  'clientAction',
  'default',
  'ErrorBoundary',
]

/** Exports of a root module beside those of any route, and where they stand. */
const afterMiddleware = ['headers', 'shouldRevalidate', 'HydrateFallback', 'Layout']

function exportedNames(statement: ts.Statement): string[] {
  const modifiers = ts.canHaveModifiers(statement) ? (ts.getModifiers(statement) ?? []) : []
  if (!modifiers.some(({ kind }) => kind === ts.SyntaxKind.ExportKeyword)) return []
  if (modifiers.some(({ kind }) => kind === ts.SyntaxKind.DefaultKeyword)) return ['default']
  if (ts.isVariableStatement(statement)) return statement.declarationList.declarations.map(({ name }) => name.getText())
  if (ts.isFunctionDeclaration(statement) && statement.name) return [statement.name.text]
  return []
}

/** What a route module exports in the wrong order, or that React Router does not know. */
export function exportProblems({ path, text }: Source): string[] {
  const file = ts.createSourceFile(path, text, ts.ScriptTarget.Latest, true, ts.ScriptKind.TSX)
  const names = file.statements.flatMap(exportedNames)
  const strange = names.filter((name) => !exportOrder.includes(name) && !afterMiddleware.includes(name))
  const known = names.filter((name) => exportOrder.includes(name))
  const sorted = [...known].sort((a, b) => exportOrder.indexOf(a) - exportOrder.indexOf(b))
  return [
    ...strange.map((name) => `${path} exports ${name}, which is no part of a route`),
    ...(known.join() === sorted.join()
      ? []
      : [`${path} exports ${known.join(', ')}: the order is ${sorted.join(', ')}`]),
  ]
}
