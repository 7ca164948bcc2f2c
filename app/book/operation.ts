import type { BookId, LayoutId, OperationId } from './ids'

/** Anything an operation may carry as a value: plain data. */
export type Json = null | boolean | number | string | readonly Json[] | { readonly [key: string]: Json }

export const OPERATION_VERSION = 1

/** What shares one revision counter and one lock. */
export type Scope = { kind: 'book'; id: BookId } | { kind: 'layout'; id: LayoutId }

export const TARGET_KINDS = ['book', 'condition', 'card', 'mark', 'layout', 'corner', 'landmark', 'stretch'] as const
export type TargetKind = (typeof TARGET_KINDS)[number]

/** Which target kinds live in which scope. */
export const SCOPE_OF_TARGET = {
  book: 'book',
  condition: 'book',
  card: 'book',
  mark: 'book',
  layout: 'layout',
  corner: 'layout',
  landmark: 'layout',
  stretch: 'layout',
} as const satisfies Record<TargetKind, Scope['kind']>

/** One field's change. `from` is what its maker saw; it is written only if it is still so. */
export interface FieldChange {
  from: Json
  to: Json
}

/**
 * One change to a team's shared content, as plain data. Making, dropping and restoring are the field `state`
 * (null → 'live' → 'dropped' → 'live'). A place, a tie, a text is one field, replaced whole.
 */
export interface Operation {
  id: OperationId
  v: typeof OPERATION_VERSION
  scope: Scope
  target: { kind: TargetKind; id: string }
  set: Record<string, FieldChange>
  /** Instant at which it was made on the maker's device, ISO 8601 with zone. */
  madeAt: string
  reason?: string
  /** The operation that this one takes back. */
  undoes?: OperationId
  /** Operations of one batch are applied and undone together. */
  batch?: string
}

/** What became of an operation. */
export type Outcome =
  | { kind: 'applied'; rev: number; undo: Operation | null }
  | { kind: 'already-applied'; rev: number }
  | { kind: 'nothing'; rev: number }
  | { kind: 'proposed'; rev: number }
  | { kind: 'conflict'; rev: number; theirs: Record<string, Json> }
  | { kind: 'refused'; reason: RefusalCode }
  | { kind: 'invalid'; problems: readonly { field: string; code: string }[] }
  | { kind: 'not-found' }

export const REFUSALS = [
  'not-a-member',
  'role',
  'another-persons',
  'read-only',
  'id-in-use',
  'newer-version',
  'unknown-target',
] as const
export type RefusalCode = (typeof REFUSALS)[number]

/** The operation that takes `operation` back: from and to exchanged, only for what was really written. */
export function reverseOf(operation: Operation, id: OperationId, madeAt: string): Operation {
  const set = Object.fromEntries(
    Object.entries(operation.set).map(([field, change]) => [field, { from: change.to, to: change.from }]),
  )
  return {
    id,
    v: OPERATION_VERSION,
    scope: operation.scope,
    target: operation.target,
    set,
    madeAt,
    undoes: operation.id,
  }
}
