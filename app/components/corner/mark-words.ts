import type { ConditionId, PersonId } from '~/book/ids'
import type { Ground } from '~/book/kinds'
import { bestProof, ownProof } from '~/book/proof'
import type { MarkView, PlaceView } from '~/book/view'
import type { GlyphForm, GlyphKind } from '~/draw/glyphs'
import { markKind } from '~/words/kinds'

/** Name of a mark as its table and map call it: "Build to", "Gear 3". */
export const markName = (mark: Pick<MarkView, 'kind' | 'role' | 'gear'>) => markKind(mark.kind, mark.role, mark.gear)

/** The glyph of a mark: a brake for the first laps has a shape of its own. */
export const glyphKind = (mark: Pick<MarkView, 'kind' | 'role'>): GlyphKind =>
  mark.kind === 'brake' && mark.role === 'start' ? 'brakestart' : mark.kind

/** The proof shown of a place: the reader's own best, else the team's; told where nobody found anything. */
export function shownProof(place: PlaceView, condition: ConditionId, reader: PersonId | null) {
  return (reader && ownProof(place.proof, condition, reader)) ?? bestProof(place.proof, condition)
}

/** The form of a mark's glyph on one ground: hollow and dashed in the simulator, by its proof on the real track. */
export function glyphForm(
  ground: Ground,
  place: PlaceView,
  condition: ConditionId,
  reader: PersonId | null,
): GlyphForm {
  return ground === 'sim' ? 'sim' : (shownProof(place, condition, reader)?.proof ?? 'told')
}
