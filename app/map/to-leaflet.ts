import L from 'leaflet'
import type { Plane, PlanePoint } from '~/track/plane'
import type { LngLat } from '~/track/units'

/** Leaflet's order is latitude, longitude: this is the one place that swaps. */
export const toLatLng = ([longitude, latitude]: LngLat): L.LatLng => new L.LatLng(latitude, longitude)
export const toLngLat = ({ lng, lat }: L.LatLng): LngLat => [lng, lat]

/** A plane point as Leaflet has it. */
export const planeToLatLng = (plane: Plane, point: PlanePoint): L.LatLng => toLatLng(plane.toLngLat(point))
export const latLngToPlane = (plane: Plane, latLng: L.LatLng): PlanePoint => plane.toPlane(toLngLat(latLng))

/**
 * The layout's own tangent plane as a reference system: at zoom z a metre is 2^z px, east is right, north is up. Drawings
 * in plane metres then lie on it exactly.
 */
export function planeCrs(plane: Plane): L.CRS {
  return L.Util.extend({}, L.CRS.Simple, {
    projection: {
      project: (latLng: L.LatLng) => {
        const { x, y } = latLngToPlane(plane, latLng)
        return new L.Point(x, y)
      },
      unproject: ({ x, y }: L.Point) => planeToLatLng(plane, { x, y }),
    },
    transformation: new L.Transformation(1, 0, -1, 0),
    distance: (a: L.LatLng, b: L.LatLng) => {
      const [p, q] = [latLngToPlane(plane, a), latLngToPlane(plane, b)]
      return Math.hypot(p.x - q.x, p.y - q.y)
    },
  })
}

/** Zoom at which a metre round a point is so many px, in any reference system. */
export function zoomFor(crs: L.CRS, plane: Plane, middle: PlanePoint, pxPerMetre: number): number {
  return Math.log2(pxPerMetre / scaleAt(crs, plane, middle, 0))
}

const SPAN = 100

/** px per metre round a point at a zoom. */
export function scaleAt(crs: L.CRS, plane: Plane, middle: PlanePoint, zoom: number): number {
  const from = crs.latLngToPoint(planeToLatLng(plane, middle), zoom)
  const to = crs.latLngToPoint(planeToLatLng(plane, { x: middle.x + SPAN, y: middle.y }), zoom)
  return from.distanceTo(to) / SPAN
}
