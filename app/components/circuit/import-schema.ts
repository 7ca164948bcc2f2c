import { z } from 'zod'
import { ROAD_WIDTH } from '~/book/limits'
import { isTimeZone } from '~/book/time-zone'
import { figure, nameField } from '~/components/form/figure'
import type { Metres } from '~/track/units'
import { circuitWords } from '~/words/circuits'
import { importWords as words } from '~/words/import'

/** The page of a circuit on its way in is one form, so that no step loses what was typed for another. */
export const IMPORT_STEPS = [
  'keep',
  'lap',
  'pieces',
  'close',
  'anchor',
  'reverse',
  'start',
  'start-at',
  'save',
  'cancel',
] as const
export type ImportStep = (typeof IMPORT_STEPS)[number]

export const stepOf = (intent: FormDataEntryValue | null): ImportStep =>
  IMPORT_STEPS.find((step) => step === intent) ?? 'keep'

const cornerRow = z.object({
  key: z.string(),
  accept: z.boolean().optional(),
  number: z.string().trim().optional(),
  name: z.string().trim().max(80, 'Up to 80 letters.').optional(),
})
export type CornerRow = z.output<typeof cornerRow>

const NUMBER = /^[0-9]{1,2}[A-Z]?$/

/** Numbers of the corners that are kept: each well formed, none twice. An empty one is the corner's place in the lap. */
function checkNumbers(rows: readonly CornerRow[], context: z.RefinementCtx) {
  const seen = new Set<string>()
  const issue = (at: number, message: string) => context.addIssue({ code: 'custom', path: [at, 'number'], message })
  for (const [at, { accept, number }] of rows.entries()) {
    if (!accept || !number) continue
    if (!NUMBER.test(number)) issue(at, circuitWords.numberWrong)
    else if (seen.has(number)) issue(at, circuitWords.numberTwice(number))
    seen.add(number)
  }
}

const degrees = (most: number, outside: string) =>
  figure({ limits: [-most, most], missing: words.anchorMissing, wrong: words.anchorWrong, outside })

/** What each step of the form needs; the others' fields are let through as they are. */
export const stepSchemas = (length: Metres) => ({
  keep: z.object({}),
  close: z.object({}),
  reverse: z.object({}),
  cancel: z.object({}),
  lap: z.object({ lap: z.coerce.number(words.lapMissing).int() }),
  pieces: z.object({ pieces: z.array(z.coerce.number().int(), words.piecesMissing).min(1, words.piecesMissing) }),
  anchor: z.object({
    longitude: degrees(180, words.longitudeOutside),
    latitude: degrees(90, words.latitudeOutside),
  }),
  start: z.object({
    startMetres: figure({
      limits: [0, length],
      missing: circuitWords.metresMissing,
      wrong: circuitWords.metresWrong,
      outside: circuitWords.metresOutside(length),
    }),
    startWay: z.enum(['ahead', 'back']),
    startFrom: z.string().optional(),
  }),
  'start-at': z.object({ startAlong: z.coerce.number().min(0) }),
  save: saveSchema,
})

const saveSchema = z.object({
  name: nameField(words.circuitNameMissing),
  layout: nameField(words.layoutMissing),
  timeZone: z.string(words.timeZoneMissing).refine(isTimeZone, words.timeZoneMissing),
  roadWidth: figure({
    limits: ROAD_WIDTH,
    missing: words.roadWidthMissing,
    wrong: words.roadWidthMissing,
    outside: words.roadWidthOutside,
  }),
  corners: z
    .array(cornerRow)
    .default([])
    .superRefine(checkNumbers)
    .refine((rows) => rows.length === 0 || rows.some(({ accept }) => accept), words.oneCorner),
})
export type SavedImport = z.output<typeof saveSchema>

/** Every field of the form, as the page names them. */
export interface ImportFields {
  name: string
  layout: string
  timeZone: string
  roadWidth: string
  corners: { key: string; accept: boolean; number: string; name: string }[]
  lap: string
  pieces: string[]
  longitude: string
  latitude: string
  startMetres: string
  startWay: string
  startFrom: string
}
