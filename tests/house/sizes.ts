import ts from 'typescript'
import type { Source } from './sources'

export const fileLimit = 300
export const routeLimit = 150
export const functionLimit = 60

const linesOf = (text: string) => text.replace(/\n$/, '').split('\n').length

/** A file that is longer than its kind may be: 300 lines, a route module 150. */
export function fileProblem({ path, text }: Source): string | undefined {
  const limit = path.startsWith('app/routes/') ? routeLimit : fileLimit
  const lines = linesOf(text)
  return lines > limit ? `${path}: ${lines} lines, ${limit} are allowed` : undefined
}

function nameOf(node: ts.SignatureDeclaration): string {
  if (node.name && 'text' in node.name) return node.name.text
  const parent = node.parent
  return ts.isVariableDeclaration(parent) && ts.isIdentifier(parent.name) ? parent.name.text : 'a function'
}

/** Functions of a module that are longer than 60 lines. What a test file tells in `describe` is a list, not a function. */
export function functionProblems({ path, text }: Source): string[] {
  const file = ts.createSourceFile(path, text, ts.ScriptTarget.Latest, true)
  const problems: string[] = []
  const visit = (node: ts.Node) => {
    const telling = ts.isCallExpression(node.parent ?? node) && /\.test\.tsx?$/.test(path)
    if (ts.isFunctionLike(node) && 'body' in node && node.body && !telling) {
      const lines = linesOf(node.getText(file))
      if (lines > functionLimit)
        problems.push(`${path}: ${nameOf(node)} has ${lines} lines, ${functionLimit} are allowed`)
    }
    ts.forEachChild(node, visit)
  }
  visit(file)
  return problems
}
