import type { CornerCut } from '~/book/cuts'
import type { MarkId, OperationId } from '~/book/ids'
import { GROUNDS, type Ground } from '~/book/kinds'
import type { Json, Operation, Outcome } from '~/book/operation'
import type { MarkView } from '~/book/view'
import { makeLapFrame } from '~/track/lap-frame'
import { type Along, along, type Metres, metres, offset } from '~/track/units'
import { acrossWords, corner as words } from '~/words/corner'
import { mannerWord } from '~/words/kinds'
import { formatGear, formatSpeed, formatToDatum } from '~/words/measures'
import { markName } from './mark-words'

/** What became of the form that was sent. */
export type CornerResult =
  | { kind: 'done'; words: string; undo: OperationId | null }
  | { kind: 'refused'; words: string }
  | { kind: 'conflict'; words: string; mine: string; theirs: string; again: Record<string, string> }

/** What was asked of a mark, as far as its answer tells. */
export type Asked =
  | { intent: 'add'; mark: Pick<MarkView, 'kind' | 'role' | 'gear'>; ground: Ground }
  | { intent: 'change' | 'clear'; mark: MarkId; ground: Ground }
  | { intent: 'drop'; mark: MarkId }

/** The words of an undo, or of a decided proposal. */
export function plainResult(outcome: Outcome, done: string, conflict: string): CornerResult {
  if (outcome.kind === 'conflict') return { kind: 'refused', words: conflict }
  if (outcome.kind === 'proposed') return { kind: 'done', words: words.undoProposed, undo: null }
  const refused = refusedWords(outcome)
  return refused ? { kind: 'refused', words: refused } : { kind: 'done', words: done, undo: null }
}

/** What became of something asked of this corner's marks. `operation` is null where there was nothing to change. */
export function intentResult(
  cut: CornerCut,
  asked: Asked,
  operation: Operation | null,
  outcome: Outcome,
  sent: Record<string, string>,
): CornerResult {
  const name = nameOf(cut, asked)
  const refused = refusedWords(outcome)
  if (refused) return { kind: 'refused', words: refused }
  if (outcome.kind === 'conflict' && operation) return conflict(cut, name, operation, outcome, sent)
  if (outcome.kind === 'proposed') return { kind: 'done', words: words.proposed(name), undo: null }
  if (!operation || outcome.kind === 'nothing') return { kind: 'done', words: words.nothing, undo: null }
  const undo = outcome.kind === 'applied' && outcome.undo ? operation.id : null
  return { kind: 'done', words: doneWords(cut, name, asked, operation), undo }
}

function refusedWords(outcome: Outcome): string | null {
  if (outcome.kind === 'refused') return words.refused(outcome.reason)
  if (outcome.kind === 'not-found') return words.gone
  return outcome.kind === 'invalid' ? words.invalid : null
}

function nameOf(cut: CornerCut, asked: Asked): string {
  if (asked.intent === 'add') return markName(asked.mark)
  const mark = cut.corner.marks.find((one) => one.id === asked.mark)
  return mark ? markName(mark) : words.mark
}

function doneWords(cut: CornerCut, name: string, asked: Asked, operation: Operation): string {
  if (asked.intent === 'drop') return words.dropped(name)
  const { ground } = asked
  if (asked.intent === 'clear') return words.cleared(name, ground)
  const toDatum = toDatumOf(cut, operation.set[ground]?.to)
  if (toDatum === null) return words.changed(name)
  const across = (operation.set[ground]?.to as { across?: number } | null | undefined)?.across ?? 0
  if (asked.intent === 'add') return words.added(name, toDatum, ground)
  const side = offset(across * (cut.layout.reversed ? -1 : 1))
  return words.moved(name, toDatum, acrossWords(side, cut.layout.roadWidth, cut.car.width), ground)
}

/** Two versions of the fields that met: in words, and the form that would put one's own over theirs. */
function conflict(
  cut: CornerCut,
  name: string,
  operation: Operation,
  outcome: Extract<Outcome, { kind: 'conflict' }>,
  sent: Record<string, string>,
): CornerResult {
  const fields = Object.keys(outcome.theirs)
  const mine = fields.map((field) => fieldWords(cut, field, operation.set[field]?.to ?? null)).join(', ')
  const theirs = fields.map((field) => fieldWords(cut, field, outcome.theirs[field] ?? null)).join(', ')
  const seen = sent.seen ? (JSON.parse(sent.seen) as Record<string, Json>) : {}
  for (const field of fields) seen[isGround(field) ? 'place' : field] = outcome.theirs[field] ?? null
  return { kind: 'conflict', words: words.conflict(name), mine, theirs, again: { ...sent, seen: JSON.stringify(seen) } }
}

const isGround = (field: string): field is Ground => (GROUNDS as readonly string[]).includes(field)

/** The value of one field of a mark as a person reads it. */
function fieldWords(cut: CornerCut, field: string, value: Json): string {
  if (value === null) return words.none
  if (isGround(field)) {
    const toDatum = toDatumOf(cut, value)
    return toDatum === null ? words.none : formatToDatum(toDatum, 1)
  }
  if (field === 'gear') return formatGear(Number(value))
  if (field === 'speed') return formatSpeed(Number(value) as Parameters<typeof formatSpeed>[0])
  if (field === 'manner') return mannerWord(value as Parameters<typeof mannerWord>[0])
  return field === 'state' ? words.takenOff : String(value)
}

function toDatumOf(cut: CornerCut, place: Json | undefined): Metres | null {
  const at = (place as { along?: number } | null | undefined)?.along
  if (at === undefined) return null
  const { length, startAlong, reversed } = cut.layout
  const frame = makeLapFrame({ length: metres(length), startAlong: startAlong as Along, reversed })
  return frame.gap(cut.corner.datum.station, frame.toStation(along(at)))
}
