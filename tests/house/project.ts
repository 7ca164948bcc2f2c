const folders = ['app', 'drizzle', 'public', 'seed', 'tests']
const files = [
  'README.md',
  'DEVELOPERS.md',
  'package.json',
  'package-lock.json',
  'biome.json',
  'knip.json',
  'tsconfig.json',
]

/** Names at the top level that are neither one of the five folders, nor a dotfile, nor a usual file. */
export function unexpectedAtTop(names: string[]): string[] {
  const expected = (name: string) =>
    name.startsWith('.') || folders.includes(name) || files.includes(name) || /^[a-z-]+\.config\.ts$/.test(name)
  return names.filter((name) => !expected(name))
}

type Manifest = { dependencies?: Record<string, string>; devDependencies?: Record<string, string> }

/** Dependencies whose version is a range. */
export function unpinned({ dependencies, devDependencies }: Manifest): string[] {
  return Object.entries({ ...dependencies, ...devDependencies })
    .filter(([, version]) => !/^\d+\.\d+\.\d+(-[\w.]+)?$/.test(version))
    .map(([name, version]) => `${name} ${version}`)
}
