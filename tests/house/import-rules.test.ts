import { describe, expect, it, test } from 'vitest'
import { importProblem } from './import-rules'
import { importsOf } from './imports'
import { isTest, type Source, sourcesBelow } from './sources'

const problemsIn = (source: Source) => importsOf(source).flatMap((what) => importProblem(source.path, what) ?? [])
const problemsOf = (path: string, text: string) => problemsIn({ path, text })

test('modules import only what their folder may', () => {
  const sources = sourcesBelow('app', 'seed').filter(({ path }) => /\.tsx?$/.test(path) && !isTest(path))
  expect(sources.length).toBeGreaterThan(50)
  expect(sources.flatMap(problemsIn)).toEqual([])
})

describe('the check of imports sees', () => {
  const bad: [rule: string, path: string, text: string][] = [
    ['a later pure folder', 'app/track/plane.ts', "import { markKinds } from '~/book/kinds'"],
    ['words in a pure folder', 'app/book/cuts.ts', "import { formatMetres } from '../words/measures'"],
    ['React in a pure folder', 'app/draw/strip.ts', "import { useMemo } from 'react'"],
    ['Node in a pure folder', 'app/track/read-layout.ts', "import { readFileSync } from 'fs'"],
    ['whole zod in a pure folder', 'app/book/schemas.ts', "import { z } from 'zod'"],
    ['a type of the database in a pure folder', 'app/book/rows.ts', "import type { Db } from '~/db/database'"],
    ['a renderer in a display list', 'app/draw/strip.ts', "export { Strip } from './svg/strip'"],
    ['Leaflet outside the map', 'app/components/corner/map.tsx', "import 'leaflet/dist/leaflet.css'"],
    ['Drizzle in a route', 'app/routes/book.tsx', "import { eq } from 'drizzle-orm'"],
    ['the schema in a route', 'app/routes/book.tsx', "import { books } from '~/db/schema'"],
    ['the database in a component', 'app/components/tabs.tsx', "const load = () => import('~/db/read-book.server')"],
    ['argon2 outside sign-in', 'app/routes/sign-in.tsx', "import { verify } from '@node-rs/argon2'"],
    ['a map that is not lazy', 'app/routes/corner.tsx', "import { CornerMap } from '~/map/corner-map'"],
    ['one route in another', 'app/routes/corner.tsx', "import { loader } from './book'"],
    ['tests in the app', 'app/components/tabs.tsx', "import { rows } from '../../tests/support/book-rows'"],
    ['another folder by dots', 'app/db/read-book.server.ts', "import { assemble } from '../book/assemble'"],
    ['a page in the database', 'app/db/read-book.server.ts', "type Tabs = import('~/components/tabs').Tabs"],
  ]
  it.each(bad)('%s', (_rule, path, text) => {
    expect(problemsOf(path, text)).toHaveLength(1)
  })

  const good: [rule: string, path: string, text: string][] = [
    ['an earlier pure folder', 'app/draw/strip.ts', "import { station } from '~/track/units'"],
    ['a neighbour', 'app/track/corners.ts', "import { plane } from './plane'"],
    ['a package that computes', 'app/track/locate.ts', "import Flatbush from 'flatbush'"],
    ['a lazy map', 'app/routes/corner.tsx', "const CornerMap = lazy(() => import('~/map/corner-map'))"],
    ['types of a map', 'app/routes/corner.tsx', "import type { MapProps } from '~/map/corner-map'"],
    ['React in a renderer', 'app/draw/svg/strip.tsx', "import { memo } from 'react'"],
    ['Drizzle in the database', 'app/db/read-book.server.ts', "import { eq } from 'drizzle-orm'"],
  ]
  it.each(good)('nothing wrong with %s', (_rule, path, text) => {
    expect(problemsOf(path, text)).toEqual([])
  })
})
