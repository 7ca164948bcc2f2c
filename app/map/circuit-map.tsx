import { useMemo, useState } from 'react'
import { type CircuitScene, circuitShapes } from '~/draw/circuit-map'
import { mapFurniture } from '~/draw/furniture'
import { DETAIL_FROM, type Projection } from '~/draw/projection'
import { roadOf } from '~/draw/road'
import type { Reader } from '~/draw/text-styles'
import { makeFrame } from '~/track/layout-frame'
import { type LngLat, type Station, station } from '~/track/units'
import { Handle } from './handle'
import { MapFrame, type MapFrameWords } from './map-frame'
import { labelRoom, useMapView } from './map-view'
import { FixedLayer, SheetLayer } from './sheet-layer'

export interface CircuitMapProps {
  scene: CircuitScene
  projection: Projection
  reader: Reader
  words: MapFrameWords & {
    /** "500 m" */
    metres: (value: number) => string
    /** What a screen reader says of the start line's handle. */
    start: string
  }
  /** The start line was let go here, on the road or beside it. Left out where it may not be moved. */
  onStartMove?: ((to: LngLat) => void) | undefined
  /** The start line was pushed by so many metres, further on positive. */
  onStartNudge?: ((metres: number) => void) | undefined
  onReady?: (() => void) | undefined
}

/** A whole layout on a map: its way round, its bends with their plates, its start line to take hold of. */
export function CircuitMap(props: CircuitMapProps) {
  const { scene, projection, words, onReady } = props
  const { plane } = scene.road.frame.centreline
  return (
    <MapFrame {...{ plane, words, onReady }} home={projection}>
      <CircuitLayers {...props} />
    </MapFrame>
  )
}

function CircuitLayers({ scene, reader, words, onStartMove, onStartNudge }: CircuitMapProps) {
  const { plane } = scene.road.frame.centreline
  const view = useMapView(plane, DETAIL_FROM)
  const { window, sheet } = view
  const [held, setHeld] = useState<LngLat | null>(null)
  const shown = useMemo(() => (held ? withStartAt(scene, held) : scene), [scene, held])
  const furniture = useMemo(() => mapFurniture(window, words, reader), [window, words, reader])
  const shapes = useMemo(
    () => circuitShapes(shown, sheet, reader, labelRoom(view, furniture.boxes)),
    [shown, sheet, reader, view, furniture],
  )
  const drop = (to: LngLat) => {
    setHeld(null)
    onStartMove?.(to)
  }
  return (
    <>
      <SheetLayer plane={plane} projection={sheet} shapes={shapes} />
      {onStartMove || onStartNudge ? (
        <Handle
          at={scene.road.frame.pointAt(station(0))}
          label={words.start}
          movable
          layer={0}
          className="map-start"
          onDrag={onStartMove ? setHeld : undefined}
          onDrop={drop}
          onNudge={onStartNudge ? ({ forward }) => onStartNudge(forward) : undefined}
        >
          <i />
        </Handle>
      ) : null}
      <FixedLayer projection={window} shapes={furniture.shapes} />
    </>
  )
}

/** The scene with its start line under the hand; corners stay where they are on the ground. */
function withStartAt(scene: CircuitScene, to: LngLat): CircuitScene {
  const { frame, width } = scene.road
  const { centreline, reversed } = frame
  const moved = makeFrame(centreline, { startAlong: frame.toAlong(frame.locate(to).station), reversed })
  const again = (at: Station) => moved.toStation(frame.toAlong(at))
  const corners = scene.corners.map(({ entry, exit, ...corner }) => ({
    ...corner,
    apex: again(corner.apex),
    ...(entry === undefined || exit === undefined ? {} : { entry: again(entry), exit: again(exit) }),
  }))
  return { ...scene, road: roadOf(moved, width), corners }
}
