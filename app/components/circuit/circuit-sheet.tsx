import { type ReactNode, useDeferredValue, useMemo } from 'react'
import { useSheetWidth } from '~/components/geometry/sheet-width'
import { CircuitMap } from '~/components/map/circuit-map'
import { type CircuitCorner, circuitProjection, circuitScene } from '~/draw/circuit-map'
import type { GroundFeature } from '~/draw/ground'
import { lapHeights } from '~/draw/lap-heights'
import type { Road } from '~/draw/road'
import { Drawing } from '~/draw/svg/drawing'
import type { Along, LngLat } from '~/track/units'
import { circuitMapWords } from '~/words/circuits'
import { importWords } from '~/words/import'
import { heightsLabel, heightWords } from '~/words/overview'

interface CircuitSheetProps {
  road: Road
  title: string
  corners: readonly CircuitCorner[]
  ground?: readonly GroundFeature[]
  /** Width in px that the server draws for. */
  width: number
  /** The start line was dragged to this place of the drawn line. Left out where it may not be moved. */
  onStartMove?: ((to: Along) => void) | undefined
}

const NONE: readonly never[] = []
const PHONE_UNDER = 600

/** Height of the map for its width: a phone's is squarer. */
const mapHeight = (width: number) => Math.round(width * (width < PHONE_UNDER ? 0.88 : 0.66))
const heightsHeight = (width: number) => (width < PHONE_UNDER ? 130 : 160)

/** A layout as it is driven: map with its corners' plates, and below it the heights of one lap. */
export function CircuitSheet({ width: guess, ...sheet }: CircuitSheetProps): ReactNode {
  const [ref, measured] = useSheetWidth(guess)
  const width = useDeferredValue(measured)
  return (
    <div ref={ref} className="overflow-hidden border border-rule-strong">
      <MapDrawing {...sheet} width={width} />
      <HeightsDrawing road={sheet.road} corners={sheet.corners} width={width} />
    </div>
  )
}

function MapDrawing({ road, title, corners, ground = NONE, width, onStartMove }: CircuitSheetProps) {
  const reader = width < PHONE_UNDER ? 'phone' : 'desk'
  const height = mapHeight(width)
  const scene = useMemo(() => circuitScene({ road, ground, corners, warnings: NONE }), [road, ground, corners])
  const projection = useMemo(() => circuitProjection(road, { width, height }, reader), [road, width, height, reader])
  const words = useMemo(() => circuitMapWords(title), [title])
  const move = onStartMove && ((to: LngLat) => onStartMove(road.frame.toAlong(road.frame.locate(to).station)))
  return (
    <div className="relative" style={{ height }}>
      <CircuitMap {...{ scene, projection, reader, words }} onStartMove={move} />
    </div>
  )
}

function HeightsDrawing({ road, corners, width }: Pick<CircuitSheetProps, 'road' | 'corners' | 'width'>) {
  const list = useMemo(() => {
    const named = corners.map((corner) => ({ ...corner, name: corner.name || importWords.turnName(corner.number) }))
    return lapHeights({ road, corners: named, width, height: heightsHeight(width), words: heightWords })
  }, [road, corners, width])
  if (!list) return null
  return (
    <div className="border-t border-rule-strong">
      <Drawing list={list} label={heightsLabel} />
    </div>
  )
}
