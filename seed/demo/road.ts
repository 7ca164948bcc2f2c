import { locate, makeCentreline } from '~/track/centreline'
import { makeLapFrame } from '~/track/lap-frame'
import { makePlane } from '~/track/plane'
import {
  type Along,
  across,
  along,
  type LngLat,
  type Position,
  type Station,
  station,
  toMillimetre,
} from '~/track/units'
import { type LocalPoint, source } from './source'

const plane = makePlane([[source.anchor.lon, source.anchor.lat]])
const DEGREE_DIGITS = 9

const rounded = (value: number) => Number(value.toFixed(DEGREE_DIGITS))

/** WGS 84 longitude and latitude of local metres, to about a tenth of a millimetre. */
export function toLngLat([x, y]: LocalPoint): LngLat {
  const [longitude, latitude] = plane.toLngLat({ x, y })
  return [rounded(longitude), rounded(latitude)]
}

/** The road's middle in driving order from the start line, with heights. */
export const positions: Position[] = source.centreline.rows.map(([, x, y, z]) => [...toLngLat([x, y]), z])

export const centreline = makeCentreline(positions)

/** The circuit is drawn from its start line in driving direction, so that stations and metres of the drawn line are one. */
export const frame = makeLapFrame({ length: centreline.length, startAlong: along(0), reversed: false })

/** Metres of the drawn line at a station of the source, which counts a whole lap as its own length. */
export function alongAt(sourceStation: number): Along {
  const rows = source.centreline.rows
  const within = ((sourceStation % source.length) + source.length) % source.length
  const step = source.length / rows.length
  const before = Math.floor(within / step)
  const share = within / step - before
  const { stations } = centreline
  return along(toMillimetre(stations[before]! + share * (stations[before + 1]! - stations[before]!)))
}

export const acrossOf = (offset: number) => across(toMillimetre(offset))

/** Where a local point lies: metres of the drawn line and sideways of it. */
export function locateLocal(point: LocalPoint) {
  const found = locate(centreline, toLngLat(point))
  return { along: along(toMillimetre(found.station)), across: across(toMillimetre(found.offset)) }
}

/** Signed metres along the road from one place to another, the shorter way round. */
export const roadGap = (from: Along, to: Along) => frame.gap(asStation(from), asStation(to))
/** Metres forward along the road from one place to another. */
export const roadAhead = (from: Along, to: Along) => frame.ahead(asStation(from), asStation(to))

const asStation = (value: Along): Station => station(frame.toStation(value))
