import { readdirSync, readFileSync } from 'node:fs'
import { join, relative, resolve } from 'node:path'

/** The checkout. */
export const root = resolve(import.meta.dirname, '../..')

export type Source = {
  /** Path from the checkout, with slashes: `app/track/plane.ts`. */
  path: string
  text: string
}

/** Every TypeScript, JavaScript and style file below these folders of the checkout, read. */
export function sourcesBelow(...folders: string[]): Source[] {
  return folders
    .flatMap((folder) => readdirSync(join(root, folder), { withFileTypes: true, recursive: true }))
    .filter((entry) => entry.isFile() && /\.(tsx?|mjs|css)$/.test(entry.name))
    .map((entry) => join(entry.parentPath, entry.name))
    .map((file) => ({ path: relative(root, file), text: readFileSync(file, 'utf8') }))
}

/** The file without its tests. */
export const isTest = (path: string) => /\.test\.tsx?$/.test(path)
