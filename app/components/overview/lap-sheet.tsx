import { type ReactNode, Suspense, useDeferredValue, useMemo } from 'react'
import { href, Link } from 'react-router'
import type { Overview } from '~/book/cuts'
import { DrawingBoundary } from '~/components/geometry/drawing-boundary'
import { useCentreline, useGround } from '~/components/geometry/geometry-store'
import { useSheetWidth } from '~/components/geometry/sheet-width'
import { type GroundFeature, readGround } from '~/draw/ground'
import { lapHeights } from '~/draw/lap-heights'
import { lapMap } from '~/draw/lap-map'
import { type Road, roadOf } from '~/draw/road'
import { Drawing } from '~/draw/svg/drawing'
import { makeFrame } from '~/track/layout-frame'
import { turningNumber } from '~/track/turning-number'
import { along, type Metres, metres } from '~/track/units'
import { formatMetres } from '~/words/measures'
import {
  circuitLine,
  contourNote,
  heightsLabel,
  heightWords,
  lapDirection,
  mapDescription,
  mapLabel,
  overviewWords,
  plateLabel,
  shortHeightWords,
} from '~/words/overview'

interface LapSheetProps {
  overview: Overview
  team: string
  /** Query of the address, kept on the way into a corner. */
  search: string
  /** Width in px that the server draws for. */
  sheet: number
}

/** The whole circuit: its map, and below it the heights of one lap. */
export function LapSheet(props: LapSheetProps) {
  return (
    <div className="lap-sheet">
      <DrawingBoundary>
        <Suspense fallback={<Waiting />}>
          <LapDrawings {...props} />
        </Suspense>
      </DrawingBoundary>
    </div>
  )
}

/** A drawing narrower than this is a phone's. */
const PHONE_UNDER = 600

/** Height of the map for its width: a phone's is squarer. */
const mapHeight = (width: number) => Math.round(width * (width < PHONE_UNDER ? 1 : 656 / 956))
const heightsHeight = (width: number) => (width < PHONE_UNDER ? 176 : 191)

/** Measures itself: a width that came from outside would take the server's drawing away before the geometry is there. */
function LapDrawings({ overview, team, search, sheet }: LapSheetProps) {
  const { layout } = overview
  const [ref, measured] = useSheetWidth(sheet)
  const width = useDeferredValue(measured)
  const centreline = useCentreline(team, layout.centreline)
  const collection = useGround(team, layout.ground)
  const { startAlong, reversed, roadWidth } = layout
  const road = useMemo(
    () => roadOf(makeFrame(centreline, { startAlong: along(startAlong), reversed }), roadWidth),
    [centreline, startAlong, reversed, roadWidth],
  )
  const ground = useMemo(() => readGround(collection, centreline.plane), [collection, centreline])
  const corners = useMemo(() => linkedCorners(overview, team, search), [overview, team, search])
  return (
    <div ref={ref}>
      <MapDrawing {...{ overview, road, ground, corners, width }} />
      <HeightsDrawing {...{ road, corners, width }} />
    </div>
  )
}

type LinkedCorner = ReturnType<typeof linkedCorners>[number]

function linkedCorners({ corners, book }: Overview, team: string, search: string) {
  return corners.map((corner) => ({
    id: corner.id,
    number: corner.number,
    name: corner.name,
    direction: corner.direction,
    apex: corner.apex,
    href: href('/teams/:team/books/:book/corners/:number', { team, book: book.slug, number: corner.number }) + search,
    label: plateLabel(corner),
  }))
}

interface MapDrawingProps {
  overview: Overview
  road: Road
  ground: readonly GroundFeature[]
  corners: readonly LinkedCorner[]
  width: number
}

function MapDrawing({ overview, road, ground, corners, width }: MapDrawingProps) {
  const { circuit, layout, kerbs } = overview
  const turns = turningNumber(road.frame.centreline) * (layout.reversed ? -1 : 1)
  const line = circuitLine(layout.length, corners.length, lapDirection(turns))
  const list = useMemo(() => {
    const step = contourStep(ground)
    const words = {
      title: circuit.name,
      line,
      contours: step === null ? null : contourNote(step),
      metres: (value: number) => formatMetres(metres(value)),
    }
    return lapMap({ road, ground, landmarks: kerbs, corners, width, height: mapHeight(width), words }).list
  }, [road, ground, kerbs, corners, width, circuit.name, line])
  return <Drawing list={list} label={mapLabel(circuit.name)} description={mapDescription(line)} link={Link} />
}

function HeightsDrawing({ road, corners, width }: Pick<MapDrawingProps, 'road' | 'corners' | 'width'>) {
  const list = useMemo(() => {
    const words = width < PHONE_UNDER ? shortHeightWords : heightWords
    return lapHeights({ road, corners, width, height: heightsHeight(width), words })
  }, [road, corners, width])
  return (
    <div className="lap-heights">
      {list ? (
        <Drawing list={list} label={heightsLabel} link={Link} />
      ) : (
        <p className="muted">{overviewWords.noHeights}</p>
      )}
    </div>
  )
}

/** Metres between contours: the least step among their heights; null where there are not two of them. */
function contourStep(ground: readonly GroundFeature[]): Metres | null {
  const heights = [...new Set(ground.flatMap(({ height }) => height ?? []))].sort((a, b) => a - b)
  const steps = heights.slice(1).map((height, i) => height - heights[i]!)
  return steps.length > 0 ? metres(Math.min(...steps)) : null
}

/** Three ruled lines while the geometry comes. */
function Waiting(): ReactNode {
  return (
    <div className="lap-waiting" aria-hidden="true">
      <i />
      <i />
      <i />
    </div>
  )
}
