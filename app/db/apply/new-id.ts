import { v7 } from 'uuid'
import type { OperationId } from '~/book/ids'

/** A new identifier, UUIDv7: made here only for what no person's device made. */
export const newId = <Kind extends string = OperationId>() => v7() as Kind
