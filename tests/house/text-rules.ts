import ts from 'typescript'
import { pureFolders } from './import-rules'
import { isTest, type Source } from './sources'

const isPure = (path: string) =>
  pureFolders.some((folder) => path.startsWith(`${folder}/`)) && !isTest(path) && !/^app\/draw\/(svg|pdf)\//.test(path)

/** Globals that make a result depend on something else than the arguments. */
const impure: [what: string, pattern: RegExp][] = [
  ['the clock', /^(Date\.now|performance\.now|Temporal\.Now\..*)$/],
  ['chance', /^(Math\.random|crypto\.\w+)$/],
  ['the network', /^(fetch|WebSocket|EventSource)$/],
  ['timers', /^(setTimeout|setInterval|queueMicrotask|requestAnimationFrame)$/],
  ['the screen', /^(window|document|navigator|localStorage)\b.*$/],
  ['the process', /^(process|globalThis)\b.*$/],
  ['the console', /^console\b.*$/],
]

/** Uses of clock, chance, network, screen, process or console in a module of a pure folder. */
export function impurities({ path, text }: Source): string[] {
  if (!isPure(path)) return []
  const problems: string[] = []
  const visit = (node: ts.Node) => {
    const called = ts.isCallExpression(node) ? node.expression.getText() : ''
    const read = ts.isPropertyAccessExpression(node) ? node.getText() : ''
    const made = ts.isNewExpression(node) ? node.expression.getText() : ''
    const found = impure.find(([, pattern]) => [called, read, made].some((name) => name !== '' && pattern.test(name)))
    if (found) problems.push(`${path}: ${node.getText().slice(0, 40)} uses ${found[0]}`)
    if (made === 'Date') problems.push(`${path}: ${node.getText().slice(0, 40)} uses dates of the machine`)
    if (!found) ts.forEachChild(node, visit)
  }
  visit(ts.createSourceFile(path, text, ts.ScriptTarget.Latest, true))
  return problems
}

/** The environment is read in one place. */
export function environmentProblem({ path, text }: Source): string | undefined {
  if (!path.startsWith('app/') || path === 'app/env.server.ts') return undefined
  return /\bprocess\s*\.\s*env\b|\bprocess\s*\[|from 'node:process'/.test(text)
    ? `${path} reads the environment`
    : undefined
}

const leftOvers: [what: string, pattern: RegExp][] = [
  ['an open end', /\b(TODO|FIXME|XXX)\b|not implemented/i],
  ['a silenced check', /@ts-ignore|@ts-nocheck|biome-ignore (lint|assist)|eslint-disable/],
  ['a type given up', /\bas any\b(?! other)/],
  ['a swallowed error', /\.catch\(\(\) => (null|undefined|\{\s*\})\)/],
  ['a test that is left out or alone', /\b(it|test|describe)\.(only|skip|todo)\(/],
  ['a sleep', /waitForTimeout|new Promise\(\(?\w*\)? => setTimeout\(/],
]

/** A form is read where a broken one becomes a refusal. */
export function formProblem({ path, text }: Source): string | undefined {
  if (!path.startsWith('app/') || path === 'app/middleware/read-form.server.ts') return undefined
  return /\.formData\(\)/.test(text) ? `${path} reads a form itself: readForm does` : undefined
}

/** Things that are never left in a file. The files that name them in order to find them are not looked at. */
export function leftOver({ path, text }: Source): string | undefined {
  const found = leftOvers.find(([, pattern]) => pattern.test(text))
  return found ? `${path} holds ${found[0]}` : undefined
}

/** `utils` and its like have no home here. */
export function nameProblem(path: string): string | undefined {
  return /(^|[/.-])(utils?|helpers?|misc|common)([/.-]|$)/i.test(path)
    ? `${path}: name it after what it holds`
    : undefined
}
