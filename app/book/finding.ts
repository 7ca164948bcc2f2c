import * as z from 'zod/mini'
import { FINDING_METHODS, FINDING_VERDICTS, GROUNDS, PROOFS } from './kinds'

/** What someone found of one place of a mark, as it is sent. Findings are only ever added. */

const METRES_LIMIT = 40_000
const ACCURACY_LIMIT = 10_000

/** Metres rounded to 1 mm, as those of operations. */
const length = z.pipe(
  z.number().check(z.gte(-METRES_LIMIT), z.lte(METRES_LIMIT)),
  z.transform((value: number) => Math.round(value * 1000) / 1000 || 0),
)

export const findingSchema = z.strictObject({
  id: z.uuid(),
  mark: z.uuid(),
  ground: z.enum(GROUNDS),
  /** Whose proof it is; who sends it is who found it. */
  person: z.uuid(),
  condition: z.uuid(),
  verdict: z.enum(FINDING_VERDICTS),
  proof: z.enum(PROOFS),
  method: z.enum(FINDING_METHODS),
  accuracy: z.nullable(z.number().check(z.gte(0), z.lte(ACCURACY_LIMIT))),
  /** Where it was found: metres of the drawn line. */
  along: length,
  across: length,
  foundAt: z.iso.datetime({ offset: true }),
  note: z.string().check(z.maxLength(2000)),
})

export type FindingEntry = z.output<typeof findingSchema>
