import { useDeferredValue, useMemo } from 'react'
import { useCentreline, useGround } from '~/components/geometry/geometry-store'
import { type CornerReading, type CornerScene, cornerProjection, cornerScene, stretchOfMarks } from '~/draw/corner-map'
import { readGround } from '~/draw/ground'
import type { Projection } from '~/draw/projection'
import { roadOf } from '~/draw/road'
import { type LayoutFrame, makeFrame } from '~/track/layout-frame'
import { along } from '~/track/units'
import { aimsOf, drivenPoints, mapMarks } from './map-marks'
import type { CornerPageData } from './page-data'
import type { PendingPlace } from './use-place-edits'

/** The layout as it is driven; waits for its centreline. */
export function useFrame(page: CornerPageData): LayoutFrame {
  const { layout } = page.cut
  const centreline = useCentreline(page.team, layout.centreline)
  const { startAlong, reversed } = layout
  return useMemo(
    () => makeFrame(centreline, { startAlong: along(startAlong), reversed }),
    [centreline, startAlong, reversed],
  )
}

const HEIGHT = { desk: 400, phone: 320 } as const
const PHONE_UNDER = 600

const NOTHING: readonly PendingPlace[] = []

export interface CornerDrawing {
  scene: CornerScene
  reading: CornerReading
  /** The view that shows all marks of the corner. */
  projection: Projection
}

/** Everything that the corner's map is drawn from, still or live. */
export function useCornerDrawing(
  page: CornerPageData,
  frame: LayoutFrame,
  view: { selected: string | null; pending: readonly PendingPlace[]; width: number },
): CornerDrawing {
  const { selected, pending } = view
  const width = useDeferredValue(view.width)
  const reader = width < PHONE_UNDER ? 'phone' : 'desk'
  const scene = useScene(page, frame)
  const marks = useMemo(() => mapMarks(page, frame, pending), [page, frame, pending])
  const reading: CornerReading = useMemo(
    () => ({
      marks,
      show: page.show,
      selected,
      labels: true,
      driven: drivenPoints(marks, page, frame),
      aims: aimsOf(page),
      reader,
    }),
    [marks, page, selected, frame, reader],
  )
  const projection = useMemo(() => {
    const stretch = stretchOfMarks(scene.road, page.cut.corner, mapMarks(page, frame, NOTHING))
    return cornerProjection(scene.road, stretch, { width, height: HEIGHT[reader] })
  }, [scene, page, frame, width, reader])
  return { scene, reading, projection }
}

function useScene(page: CornerPageData, frame: LayoutFrame): CornerScene {
  const { layout, landmarks, corner } = page.cut
  const collection = useGround(page.team, layout.ground)
  return useMemo(
    () =>
      cornerScene({
        road: roadOf(frame, layout.roadWidth),
        ground: readGround(collection, frame.centreline.plane),
        landmarks,
        direction: corner.direction,
        datum: corner.datum.station,
      }),
    [frame, layout.roadWidth, collection, landmarks, corner.direction, corner.datum.station],
  )
}
