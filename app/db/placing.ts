import type { LandmarkId } from '~/book/ids'
import type { Place, Placement, Tie } from '~/book/place'
import { across, along, type Metres } from '~/track/units'
import { type landmarkPlacements, places, type stretchPlacements, ties } from './schema'

/** Places, ties and placements between their rows and the values that operations and views carry. */

/** Columns of a place and of its tie, for a read that left-joins both. */
export const placeColumns = {
  ground: places.ground,
  along: places.along,
  across: places.across,
  tied: ties.markId,
  landmarkId: ties.landmarkId,
  alongFrom: ties.alongFrom,
  alongBlock: ties.alongBlock,
  alongMetres: ties.alongMetres,
  alongLengths: ties.alongLengths,
  acrossPart: ties.acrossPart,
  acrossOn: ties.acrossOn,
  acrossMetres: ties.acrossMetres,
  words: ties.words,
  acrossWords: ties.acrossWords,
}

type TieColumns = Pick<
  typeof ties.$inferSelect,
  | 'landmarkId'
  | 'alongFrom'
  | 'alongBlock'
  | 'alongMetres'
  | 'alongLengths'
  | 'acrossPart'
  | 'acrossOn'
  | 'acrossMetres'
  | 'words'
  | 'acrossWords'
>

/** A place from its row; `tied` is null where it hangs on nothing. */
export function placeFrom(row: TieColumns & { along: number; across: number; tied: string | null }): Place {
  return { along: along(row.along), across: across(row.across), tie: row.tied === null ? null : tieFrom(row) }
}

function tieFrom(row: TieColumns): Tie {
  const { alongFrom, alongBlock, alongMetres, alongLengths, acrossPart, acrossOn, acrossMetres } = row
  return {
    landmarkId: row.landmarkId,
    along:
      alongFrom === null
        ? null
        : { from: alongFrom, block: alongBlock, metres: alongMetres ?? 0, lengths: alongLengths ?? 0 },
    across:
      acrossPart === null || acrossOn === null ? null : { part: acrossPart, on: acrossOn, metres: acrossMetres ?? 0 },
    words: row.words,
    acrossWords: row.acrossWords,
  }
}

/** The columns of a tie. */
export function tieColumns(tie: Tie): TieColumns {
  return {
    landmarkId: tie.landmarkId as LandmarkId | null,
    alongFrom: tie.along?.from ?? null,
    alongBlock: tie.along?.block ?? null,
    alongMetres: tie.along?.metres ?? null,
    alongLengths: tie.along?.lengths ?? null,
    acrossPart: tie.across?.part ?? null,
    acrossOn: tie.across?.on ?? null,
    acrossMetres: tie.across?.metres ?? null,
    words: tie.words,
    acrossWords: tie.acrossWords,
  }
}

/** Columns of a placement, of either table. */
export const placementColumns = (table: typeof landmarkPlacements | typeof stretchPlacements) => ({
  ground: table.ground,
  along: table.along,
  until: table.until,
  across: table.across,
  acrossTo: table.acrossTo,
  edgeLength: table.edgeLength,
  blockLength: table.blockLength,
  width: table.width,
  words: table.words,
})

export type PlacementRow = Omit<typeof landmarkPlacements.$inferSelect, 'teamId' | 'landmarkId' | 'ground'>

/** A placement from its row. */
export function placementFrom(row: PlacementRow): Placement {
  return {
    along: along(row.along),
    until: row.until === null ? null : along(row.until),
    across: row.across === null ? null : across(row.across),
    acrossTo: row.acrossTo === null ? null : across(row.acrossTo),
    edgeLength: row.edgeLength as Metres | null,
    blockLength: row.blockLength as Metres | null,
    width: row.width as Metres | null,
    words: row.words,
  }
}
