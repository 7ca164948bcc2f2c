import type L from 'leaflet'
import { useState } from 'react'
import { useMap, useMapEvents } from 'react-leaflet'
import type { Box } from '~/draw/display-list'
import { makeProjection, type Projection } from '~/draw/projection'
import type { Plane } from '~/track/plane'
import { latLngToPlane, scaleAt } from './to-leaflet'

/** What a map shows at rest. */
export interface MapView {
  /** The visible part. */
  window: Projection
  /** The part that is drawn: half as much again to every side, so that a drag does not run off the drawing. */
  sheet: Projection
  /** The window within the sheet, px of the sheet. */
  frame: Box
}

const PADDING = 0.5

function viewOf(map: L.Map, plane: Plane, detailFrom: number): MapView {
  const { x: width, y: height } = map.getSize()
  const middle = latLngToPlane(plane, map.getCenter())
  const pxPerMetre = scaleAt(map.options.crs!, plane, middle, map.getZoom())
  const detail = pxPerMetre >= detailFrom
  const around = (share: number) =>
    makeProjection({
      middle,
      pxPerMetre,
      width: Math.round(width * (1 + 2 * share)),
      height: Math.round(height * (1 + 2 * share)),
      detail,
    })
  const sheet = around(PADDING)
  const frame = { x: (sheet.width - width) / 2, y: (sheet.height - height) / 2, width, height }
  return { window: around(0), sheet, frame }
}

/** The view of the map around, renewed whenever it comes to rest. */
export function useMapView(plane: Plane, detailFrom: number): MapView {
  const map = useMap()
  const [view, setView] = useState(() => viewOf(map, plane, detailFrom))
  const renew = () => setView(viewOf(map, plane, detailFrom))
  useMapEvents({ moveend: renew, zoomend: renew, resize: renew })
  return view
}

const INSET = 4

/** Where labels may lie on the sheet, and the boxes of the window's furniture that they keep off. */
export function labelRoom({ frame }: MapView, furniture: readonly Box[]): { sheet: Box; boxes: Box[] } {
  const { x, y, width, height } = frame
  return {
    sheet: { x: x + INSET, y: y + INSET, width: width - 2 * INSET, height: height - 2 * INSET },
    boxes: furniture.map((box) => ({ ...box, x: box.x + x, y: box.y + y })),
  }
}
