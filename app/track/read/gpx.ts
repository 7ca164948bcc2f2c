import { decimalCommas, heightsLeftOut, leftOut, tooManyPositions } from '~/track/read/notes'
import {
  coordinateFits,
  coordinateProblem,
  decimalWithComma,
  hasDecimalComma,
  instant,
  numberProblem,
} from '~/track/read/numbers'
import { type Line, mostPositions, Points, type Reading, roomFor, tidyName } from '~/track/read/points'
import { type Problem, problem, several } from '~/track/read/problems'
import type { XmlPlace, XmlReader } from '~/track/read/xml'

export const gpxNamespaces = ['http://www.topografix.com/GPX/1/1', 'http://www.topografix.com/GPX/1/0']

/** Elements whose content is not looked at. */
const skipped = new Set(['extensions', 'link', 'author', 'copyright', 'bounds'])

/**
 * Reads GPX 1.0 and 1.1: the segments of its tracks, or its routes where it has no track. Points without a time or a
 * height keep their place. A height or a time that cannot be read is left out.
 */
export class GpxReader implements XmlReader {
  private readonly points: Points
  private readonly segments: Line[] = []
  private readonly routes: Line[] = []
  private readonly path: string[] = []
  private start = -1
  private lineWhere = ''
  private lineName: string | undefined
  private fileName: string | undefined
  private wayPoints = 0
  private badHeights = 0
  private commas = 0
  private lon = 0
  private lat = 0
  private height = Number.NaN
  private time = Number.NaN
  private heard = ''

  /** @param bytes size of the file */
  constructor(
    private readonly place: XmlPlace,
    bytes: number,
  ) {
    this.points = new Points(roomFor(bytes, 24))
  }

  open(name: string, attributes: Readonly<Record<string, string>>): 'skip' | undefined {
    if (skipped.has(name)) return 'skip'
    this.path.push(name)
    this.heard = ''
    if (name === 'trk' || name === 'rte') this.lineName = undefined
    if (name === 'trkseg' || name === 'rte') this.begin()
    if (name === 'wpt') this.wayPoints++
    if (name === 'trkpt' || name === 'rtept') this.beginPoint(attributes)
    return undefined
  }

  text(text: string): void {
    const name = this.path.at(-1)
    if (name === 'ele' || name === 'time' || name === 'name') this.heard += text
  }

  close(name: string): void {
    this.path.pop()
    const parent = this.path.at(-1)
    if (parent === 'trkpt' || parent === 'rtept') {
      if (name === 'ele') this.takeHeight(this.heard.trim())
      else if (name === 'time') this.time = instant(this.heard.trim())
    } else if (name === 'name' && (parent === 'trk' || parent === 'rte')) this.lineName = tidyName(this.heard)
    else if (name === 'name' && (parent === 'metadata' || parent === 'gpx')) this.fileName ??= tidyName(this.heard)
    if (name === 'trkpt' || name === 'rtept') this.endPoint()
    else if (name === 'trkseg') this.end(this.segments)
    else if (name === 'rte') this.end(this.routes)
  }

  private begin(): void {
    this.start = this.points.length
    this.lineWhere = this.place.where()
  }

  private end(lines: Line[]): void {
    const { start, lineName, lineWhere } = this
    this.start = -1
    if (start === -1 || this.points.length - start < 2) return
    lines.push({ start, end: this.points.length, where: lineWhere, ...(lineName && { name: lineName }) })
  }

  private beginPoint(attributes: Readonly<Record<string, string>>): void {
    this.height = Number.NaN
    this.time = Number.NaN
    this.lat = this.coordinate(attributes.lat ?? '', 'latitude')
    this.lon = this.coordinate(attributes.lon ?? '', 'longitude')
    if (!coordinateFits(this.lon, this.lat, true)) {
      this.place.stop(coordinateProblem(this.lon, this.lat, this.place.where(), true))
    }
  }

  private coordinate(text: string, what: string): number {
    const value = decimalWithComma(text.trim())
    if (Number.isNaN(value)) this.place.stop(numberProblem(text, what, this.place.where()))
    if (hasDecimalComma(text.trim())) this.commas++
    return value
  }

  private takeHeight(text: string): void {
    this.height = decimalWithComma(text)
    if (Number.isNaN(this.height) && text !== '') this.badHeights++
  }

  private endPoint(): void {
    if (this.start === -1) this.begin()
    this.points.push(this.lon, this.lat, this.height, this.time)
    if (this.points.length > mostPositions) this.place.stop(tooManyPositions(this.place.where()))
  }

  /** What the whole file came to. */
  result(): Reading {
    if (this.start !== -1) this.end(this.segments)
    const lines = this.segments.length > 0 ? this.segments : this.routes
    if (lines.length === 0) return { ok: false, problems: [this.noLine()] }
    const warnings: Problem[] = []
    if (this.wayPoints > 0) {
      warnings.push(problem('points-ignored', leftOut(this.wayPoints, 'waypoint')))
    }
    if (lines === this.segments && this.routes.length > 0) {
      const says = `The file also holds ${several(this.routes.length, 'route')}. Only its tracks are read.`
      warnings.push(problem('routes-left-out', says))
    }
    if (this.badHeights > 0) warnings.push(heightsLeftOut(this.badHeights))
    if (this.commas > 0) warnings.push(decimalCommas())
    const name = this.fileName
    return {
      ok: true,
      content: { points: this.points, lines, kind: 'trace', heightDatum: 'sea-level', ...(name && { name }) },
      warnings,
    }
  }

  private noLine(): Problem {
    if (this.points.length > 0) {
      return problem('line-too-short', 'No track of the file has two points. Bring a whole lap.')
    }
    const says =
      this.wayPoints > 0
        ? `The file holds ${several(this.wayPoints, 'waypoint')} and no track or route. Bring the track of a lap.`
        : 'The file holds no track and no route. Bring the track of a lap.'
    return problem('no-line', says)
  }
}
