import { lazy, useCallback, useMemo } from 'react'
import { nudged } from '~/book/edits'
import type { Ground } from '~/book/kinds'
import type { LayoutFrame } from '~/track/layout-frame'
import type { LngLat, Station } from '~/track/units'
import { cornerMapWords } from '~/words/corner'
import { formatToDatum } from '~/words/measures'
import type { CornerPageData } from './page-data'
import { type TypedPlace, typedFrom } from './typed-place'
import type { CornerDrawing } from './use-corner-drawing'
import type { PlaceEdits } from './use-place-edits'

const CornerMap = lazy(async () => ({ default: (await import('~/map/corner-map')).CornerMap }))

interface LiveMapProps extends CornerDrawing {
  page: CornerPageData
  frame: LayoutFrame
  edits: PlaceEdits
  onAdd: (place: TypedPlace) => void
  onSelect: (mark: string) => void
  onReady: () => void
}

/** The map to move, tap and drag on. Whoever may add may also move: what is another's becomes a proposal. */
export function LiveMap({ page, frame, edits, onAdd, onSelect, onReady, ...drawing }: LiveMapProps) {
  const datum = page.cut.corner.datum.station
  const words = useMemo(() => {
    const figure = (at: Station) => formatToDatum(frame.gap(datum, at))
    return { ...cornerMapWords(page.cut.corner.name), figure }
  }, [page.cut.corner.name, frame, datum])
  const add = (at: LngLat) => {
    const { station, offset } = frame.locate(at, datum)
    onAdd(typedFrom({ toDatum: frame.gap(datum, station), offset }))
  }
  const move = (mark: string, ground: Ground, to: LngLat) => edits.move(mark, ground, frame.locate(to, datum), true)
  const nudge = (mark: string, ground: Ground, by: { along: number; across: number }) => {
    const at = drawing.reading.marks.find((one) => one.id === mark)?.[ground]
    if (at) edits.move(mark, ground, nudged(at, { ahead: by.along, left: by.across }, frame), false)
  }
  const movable = useCallback(() => page.may.add, [page.may.add])
  return (
    <CornerMap
      {...drawing}
      {...{ words, movable, onSelect, onReady }}
      onAdd={page.may.add ? add : undefined}
      onMove={move}
      onNudge={nudge}
    />
  )
}
