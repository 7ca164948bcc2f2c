import * as z from 'zod/mini'
import { firstChoices, type ImportChoices } from '~/track/import-choices'
import { along } from '~/track/units'

const typed = z.string().check(z.maxLength(200))

/** Choices as they are kept between the steps of an import. */
const schema = z.object({
  lap: z.nullable(z.int()),
  pieces: z.nullable(z.array(z.int()).check(z.maxLength(2000))),
  anchor: z.nullable(z.tuple([z.number(), z.number()])),
  close: z.boolean(),
  reversed: z.boolean(),
  startAlong: z.number(),
  typed: z.object({
    name: typed,
    layout: typed,
    timeZone: typed,
    roadWidth: typed,
    corners: z.record(typed, z.object({ accepted: z.boolean(), number: typed, name: typed })),
  }),
})

/** The choices that were kept; the first ones where what was kept is none. */
export function choicesFrom(kept: unknown): ImportChoices {
  const parsed = schema.safeParse(kept)
  return parsed.success ? { ...parsed.data, startAlong: along(parsed.data.startAlong) } : firstChoices()
}
