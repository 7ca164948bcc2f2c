/** Branded identifiers. All are UUIDv7 strings made by whoever creates the thing, also on a phone. */

declare const kind: unique symbol
type Id<Name extends string> = string & { readonly [kind]: Name }

export type PersonId = Id<'person'>
export type TeamId = Id<'team'>
export type CircuitId = Id<'circuit'>
export type LayoutId = Id<'layout'>
export type CornerId = Id<'corner'>
export type LandmarkId = Id<'landmark'>
export type StretchId = Id<'stretch'>
export type CarId = Id<'car'>
export type BookId = Id<'book'>
export type ConditionId = Id<'condition'>
export type CardId = Id<'card'>
export type MarkId = Id<'mark'>
export type FindingId = Id<'finding'>
export type OperationId = Id<'operation'>
/** SHA-256 of a centreline's or a ground's canonical JSON, lower-case hexadecimal: the name of an immutable thing. */
export type GeometryHash = Id<'geometry'>
