import L from 'leaflet'
import { useLayoutEffect, useState } from 'react'
import { createPortal } from 'react-dom'
import { useMap } from 'react-leaflet'
import type { Shape } from '~/draw/display-list'
import type { Projection } from '~/draw/projection'
import { Shapes } from '~/draw/svg/drawing'
import type { Plane } from '~/track/plane'
import { planeToLatLng } from './to-leaflet'

interface SheetLayerProps {
  plane: Plane
  projection: Projection
  shapes: readonly Shape[]
}

const SVG = 'http://www.w3.org/2000/svg'

function boundsOf(plane: Plane, { width, height, toPlane }: Projection): L.LatLngBounds {
  return new L.LatLngBounds(planeToLatLng(plane, toPlane([0, height])), planeToLatLng(plane, toPlane([width, 0])))
}

/** A display list under the map's handles: it moves and scales with the map and is drawn anew when the map rests. */
export function SheetLayer({ plane, projection, shapes }: SheetLayerProps) {
  const map = useMap()
  const [layer] = useState(() => {
    const element = document.createElementNS(SVG, 'svg')
    return { element, overlay: new L.SVGOverlay(element, boundsOf(plane, projection), { interactive: false }) }
  })
  useLayoutEffect(() => {
    layer.overlay.addTo(map)
    return () => {
      layer.overlay.remove()
    }
  }, [layer, map])
  useLayoutEffect(() => {
    layer.overlay.setBounds(boundsOf(plane, projection))
  }, [layer, plane, projection])
  const { width, height } = projection
  return createPortal(
    <svg
      className="drawing"
      viewBox={`0 0 ${width} ${height}`}
      width="100%"
      height="100%"
      preserveAspectRatio="none"
      aria-hidden="true"
    >
      <Shapes shapes={shapes} />
    </svg>,
    layer.element,
  )
}

/** What stays in its corner of the window however the map moves. */
export function FixedLayer({ projection, shapes }: Omit<SheetLayerProps, 'plane'>) {
  const { width, height } = projection
  return (
    <svg
      className="drawing map-fixed"
      viewBox={`0 0 ${width} ${height}`}
      width={width}
      height={height}
      aria-hidden="true"
    >
      <Shapes shapes={shapes} />
    </svg>
  )
}
