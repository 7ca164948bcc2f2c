import { type ReactNode, useDeferredValue, useMemo } from 'react'
import type { LandmarkView } from '~/book/view'
import { useSheetWidth } from '~/components/geometry/sheet-width'
import { contourStep, type GroundFeature } from '~/draw/ground'
import { lapHeights } from '~/draw/lap-heights'
import { type LapCorner, lapMap } from '~/draw/lap-map'
import type { Road } from '~/draw/road'
import { Drawing } from '~/draw/svg/drawing'
import { metres } from '~/track/units'
import { importWords } from '~/words/import'
import { formatMetres } from '~/words/measures'
import { circuitLine, contourNote, heightsLabel, heightWords, mapLabel } from '~/words/overview'
import { directionOf } from './lap-facts'

interface CircuitSheetProps {
  road: Road
  title: string
  corners: readonly LapCorner[]
  ground?: readonly GroundFeature[]
  landmarks?: readonly LandmarkView[]
  /** Width in px that the server draws for. */
  width: number
}

const NONE: readonly never[] = []

/** Height of the map for its width: a phone's is squarer. */
const mapHeight = (width: number) => Math.round(width * (width < 600 ? 0.88 : 0.66))
const heightsHeight = (width: number) => (width < 600 ? 130 : 160)

/** A layout as it is driven: map with its corners' plates, and below it the heights of one lap. */
export function CircuitSheet({ width: guess, ...sheet }: CircuitSheetProps): ReactNode {
  const [ref, measured] = useSheetWidth(guess)
  const width = useDeferredValue(measured)
  return (
    <div ref={ref} className="overflow-hidden border border-rule-strong">
      <CircuitMapDrawing {...sheet} width={width} />
      <HeightsDrawing road={sheet.road} corners={sheet.corners} width={width} />
    </div>
  )
}

function CircuitMapDrawing({ road, title, corners, ground = NONE, landmarks = NONE, width }: CircuitSheetProps) {
  const list = useMemo(() => {
    const step = contourStep(ground)
    const words = {
      title,
      line: circuitLine(road.frame.length, corners.length, directionOf(road)),
      contours: step === null ? null : contourNote(step),
      metres: (value: number) => formatMetres(metres(value)),
    }
    return lapMap({ road, ground, landmarks, corners, width, height: mapHeight(width), words }).list
  }, [road, title, corners, ground, landmarks, width])
  return <Drawing list={list} label={mapLabel(title)} />
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
