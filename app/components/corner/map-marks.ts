import { makeDrivenLine } from '~/book/driven-line'
import { GROUNDS, type Ground } from '~/book/kinds'
import type { MarkView } from '~/book/view'
import type { CornerReading } from '~/draw/corner-map'
import type { MapMark, MapPlace } from '~/draw/map-marks'
import type { LayoutFrame } from '~/track/layout-frame'
import { metres, type Offset, type Station } from '~/track/units'
import { groundWord, proofWord } from '~/words/kinds'
import { formatToDatum } from '~/words/measures'
import { glyphForm, markName } from './mark-words'
import type { CornerPageData } from './page-data'
import type { PendingPlace } from './use-place-edits'

/** The marks of the page as its map shows them; a place that is being moved stands where the hand has it. */
export function mapMarks(page: CornerPageData, frame: LayoutFrame, pending: readonly PendingPlace[]): MapMark[] {
  const shown = new Set(page.lines.map((line) => line.mark))
  return page.cut.corner.marks
    .filter((mark) => shown.has(mark.id))
    .map((mark) => ({
      id: mark.id,
      kind: mark.kind,
      role: mark.role,
      gear: mark.gear,
      name: markName(mark),
      sim: mapPlace(page, frame, mark, 'sim', pending),
      real: mapPlace(page, frame, mark, 'real', pending),
    }))
}

function mapPlace(
  page: CornerPageData,
  frame: LayoutFrame,
  mark: MarkView,
  ground: Ground,
  pending: readonly PendingPlace[],
): MapPlace | null {
  const place = mark[ground]
  const moved = pending.findLast((one) => one.mark.id === mark.id && one.ground === ground)?.at
  const at = moved ?? place
  if (!at) return null
  const form = place ? glyphForm(ground, place, page.condition, page.me) : ground === 'sim' ? 'sim' : 'told'
  const figure = formatToDatum(metres(frame.gap(page.cut.corner.datum.station, at.station)))
  const known = form === 'sim' ? '' : `, ${proofWord(form)}`
  const label = `${markName(mark)}, ${figure}, ${groundWord(ground).toLowerCase()}${known}`
  return { station: at.station, offset: at.offset, form, figure, label }
}

/** The line driven through the places that the page shows, for its map. */
export function drivenPoints(marks: readonly MapMark[], page: CornerPageData, frame: LayoutFrame) {
  const places = page.lines.flatMap((line): { station: Station; offset: Offset }[] => {
    const mark = marks.find((one) => one.id === line.mark)
    return mark?.[line.ground] ? [mark[line.ground]!] : []
  })
  return makeDrivenLine(frame, places)?.points(4) ?? []
}

/** From each look mark to the thing it hangs on. */
export function aimsOf(page: CornerPageData): CornerReading['aims'] {
  return page.cut.corner.marks.flatMap((mark) => {
    if (mark.kind !== 'look') return []
    const tied = GROUNDS.flatMap((ground) => mark[ground]?.stored.tie?.landmarkId ?? [])
    return tied.slice(-1).map((landmark) => ({ mark: mark.id, landmark }))
  })
}
