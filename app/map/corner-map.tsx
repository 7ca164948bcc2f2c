import { useMemo, useState } from 'react'
import type { Ground } from '~/book/kinds'
import {
  type CornerMapWords,
  type CornerReading,
  type CornerScene,
  cornerGround,
  cornerLabels,
  cornerReading,
  DETAIL,
} from '~/draw/corner-map'
import { mapFurniture } from '~/draw/furniture'
import { placedMarks } from '~/draw/map-marks'
import type { Projection } from '~/draw/projection'
import type { LngLat, Station } from '~/track/units'
import { MapFrame, type MapFrameWords } from './map-frame'
import { labelRoom, useMapView } from './map-view'
import { type MarkHandlers, MarkHandles } from './mark-handles'
import { FixedLayer, SheetLayer } from './sheet-layer'

export interface CornerMapProps extends MarkHandlers {
  scene: CornerScene
  reading: CornerReading
  /** The view it begins with: that of the still picture. */
  projection: Projection
  words: CornerMapWords &
    MapFrameWords & {
      /** Figure of a place while it is dragged: "131 before". */
      figure: (at: Station) => string
    }
  movable: (mark: string, ground: Ground) => boolean
  /** Left out where nothing may be added. */
  onAdd?: ((at: LngLat) => void) | undefined
  onReady?: (() => void) | undefined
}

/** One corner on a map to move, tap and drag on. */
export function CornerMap(props: CornerMapProps) {
  const { scene, projection, words, onAdd, onReady } = props
  const { plane } = scene.road.frame.centreline
  return (
    <MapFrame {...{ plane, words, onReady }} home={projection} onTap={onAdd}>
      <CornerLayers {...props} />
    </MapFrame>
  )
}

interface Dragged {
  mark: string
  ground: Ground
  to: LngLat
}

function CornerLayers({ scene, reading, words, movable, onSelect, onMove, onNudge }: CornerMapProps) {
  const { road } = scene
  const { plane } = road.frame.centreline
  const view = useMapView(plane, DETAIL)
  const { window, sheet } = view
  const [dragged, setDragged] = useState<Dragged | null>(null)
  const { show, reader, selected } = reading
  const shown = useMemo(
    () => (dragged ? withDragged(scene, reading, dragged, words.figure) : reading),
    [scene, reading, dragged, words],
  )
  const ground = useMemo(() => cornerGround(scene, show, sheet, reader), [scene, show, sheet, reader])
  const furniture = useMemo(() => mapFurniture(window, words, reader), [window, words, reader])
  const read = useMemo(() => {
    const room = labelRoom(view, furniture.boxes)
    return [...cornerReading(scene, shown, sheet), ...cornerLabels(scene, shown, sheet, room.boxes, room.sheet)]
  }, [scene, shown, sheet, view, furniture])
  const placed = useMemo(() => placedMarks(reading.marks, show, road, sheet), [reading.marks, show, road, sheet])
  const drop = (mark: string, of: Ground, to: LngLat) => {
    setDragged(null)
    onMove(mark, of, to)
  }
  return (
    <>
      <SheetLayer plane={plane} projection={sheet} shapes={ground} />
      <SheetLayer plane={plane} projection={sheet} shapes={read} />
      <MarkHandles
        {...{ placed, road, selected, movable, onSelect, onNudge }}
        mirror={scene.direction === 'left'}
        onDrag={(mark, of, to) => setDragged({ mark, ground: of, to })}
        onMove={drop}
      />
      <FixedLayer projection={window} shapes={furniture.shapes} />
    </>
  )
}

/** The reading with the place in the hand where the hand has it, so that its label and its tether go along. */
function withDragged(
  { road }: CornerScene,
  reading: CornerReading,
  { mark: id, ground, to }: Dragged,
  figure: (at: Station) => string,
): CornerReading {
  const marks = reading.marks.map((mark) => {
    const place = mark[ground]
    if (mark.id !== id || !place) return mark
    const at = road.frame.locate(to, place.station)
    return { ...mark, [ground]: { ...place, ...at, figure: figure(at.station) } }
  })
  return { ...reading, marks }
}
