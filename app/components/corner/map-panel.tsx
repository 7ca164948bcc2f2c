import { useMemo } from 'react'
import { makeFrame } from '~/track/layout-frame'
import { along } from '~/track/units'
import { useCentreline, useGround } from '../geometry/geometry-store'
import type { CornerPageData } from './page-data'

export function MapPanel({ page }: { page: CornerPageData }) {
  const { layout } = page.cut
  const centreline = useCentreline(page.team, layout.centreline)
  useGround(page.team, layout.ground)
  const frame = useMemo(
    () => makeFrame(centreline, { startAlong: along(layout.startAlong), reversed: layout.reversed }),
    [centreline, layout],
  )
  return <div className="map-panel">{frame.length}</div>
}
