import type { SubmissionResult } from '@conform-to/react'
import { parseWithZod } from '@conform-to/zod/v4'
import type { LayoutId, OperationId } from '~/book/ids'
import { moveStart, renameCorners, reverseLayout } from '~/book/layout-edits'
import type { Operation } from '~/book/operation'
import { makeLapFrame } from '~/track/lap-frame'
import type { LayoutFrame } from '~/track/layout-frame'
import { along, metres, station } from '~/track/units'
import type { LayoutCorner } from './layout-data'
import { cornersSchema, reverseSchema, startAtSchema, startSchema, undoSchema } from './layout-schema'

/** A form as it came, of whatever schema. */
interface Submission {
  payload: Record<string, unknown>
  reply(options?: ReplyOptions): SubmissionResult<string[]>
}
interface ReplyOptions {
  fieldErrors?: Record<string, string[]>
}

/** What the page of a layout was asked to do. */
export type LayoutAsk =
  | { kind: 'wrong'; form: 'corners' | 'way'; submission: Submission }
  | { kind: 'change'; form: 'corners' | 'way'; operations: Operation[]; submission: Submission }
  | { kind: 'undo'; operation: OperationId | null; batch: string | null }

interface Shown {
  layout: { id: LayoutId; startAlong: number; reversed: boolean }
  frame: LayoutFrame
  corners: readonly LayoutCorner[]
}

interface Clock {
  madeAt: string
  newId: () => OperationId
}

/** Reads a sent form as one of the page's asks; without an intent it is the form of corners. */
export function layoutAsk(form: FormData, shown: Shown, clock: Clock): LayoutAsk {
  const making = { layout: shown.layout.id, ...clock }
  switch (form.get('intent')) {
    case 'undo':
      return undoAsk(form)
    case 'reverse': {
      const submission = parseWithZod(form, { schema: reverseSchema })
      if (submission.status !== 'success') return { kind: 'wrong', form: 'way', submission }
      const operations = [reverseLayout(making, submission.value.seenReversed)]
      return { kind: 'change', form: 'way', operations, submission }
    }
    case 'start':
      return startAsk(form, shown, making)
    case 'start-at': {
      const submission = parseWithZod(form, { schema: startAtSchema })
      if (submission.status !== 'success') return { kind: 'wrong', form: 'way', submission }
      const { seenStart, startAlong } = submission.value
      const operations = [moveStart(making, along(seenStart), along(startAlong % shown.frame.length))]
      return { kind: 'change', form: 'way', operations, submission }
    }
    default: {
      const submission = parseWithZod(form, { schema: cornersSchema })
      if (submission.status !== 'success') return { kind: 'wrong', form: 'corners', submission }
      const { corners, skip } = submission.value
      const operations = renameCorners(
        making,
        corners.filter(({ id }) => id !== skip),
      )
      return { kind: 'change', form: 'corners', operations, submission }
    }
  }
}

function undoAsk(form: FormData): LayoutAsk {
  const parsed = undoSchema.safeParse(Object.fromEntries(form))
  const { operation, batch } = parsed.success ? parsed.data : {}
  return { kind: 'undo', operation: (operation as OperationId | undefined) ?? null, batch: batch ?? null }
}

/** Metres count from a corner's entry, or from the start line, in the layout as the page showed it. */
function startAsk(form: FormData, { frame, corners }: Shown, making: Clock & { layout: LayoutId }): LayoutAsk {
  const submission = parseWithZod(form, { schema: startSchema(frame.length) })
  if (submission.status !== 'success') return { kind: 'wrong', form: 'way', submission }
  const { seenStart, seenReversed, startFrom, startWay, startMetres } = submission.value
  const seen = makeLapFrame({ length: frame.length, startAlong: along(seenStart), reversed: seenReversed })
  const corner = corners.find(({ id }) => id === startFrom)
  const from = corner ? seen.toStation(frame.toAlong(corner.entry)) : station(0)
  const ahead = metres(startWay === 'back' ? -startMetres : startMetres)
  const operations = [moveStart(making, along(seenStart), seen.toAlong(station(from + ahead)))]
  return { kind: 'change', form: 'way', operations, submission }
}
