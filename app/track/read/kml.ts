import { readTuples } from '~/track/read/kml-coordinates'
import { extraValues, heightsLeftOut, leftOut, tooManyPositions } from '~/track/read/notes'
import { coordinateFits, coordinateProblem, decimal, instant, numberProblem } from '~/track/read/numbers'
import { type Line, mostPositions, Points, type Reading, roomFor, tidyName } from '~/track/read/points'
import { type Problem, problem, several } from '~/track/read/problems'
import type { XmlPlace, XmlReader } from '~/track/read/xml'

export const kmlNamespaces = [
  'http://www.opengis.net/kml/2.2',
  'http://www.google.com/kml/ext/2.2',
  'http://earth.google.com/kml/2.2',
  'http://earth.google.com/kml/2.1',
  'http://earth.google.com/kml/2.0',
]

const skipped = new Set(['ExtendedData', 'Style', 'StyleMap', 'description', 'Schema', 'LookAt', 'Camera', 'Region'])
const geometries = new Set(['LineString', 'LinearRing', 'Track', 'Point'])
const heard = new Set(['name', 'coordinates', 'coord', 'when', 'altitudeMode'])

/**
 * Reads KML 2.2 (OGC 07-147r2): LineString, LinearRing, the outer rings of polygons, and gx:Track. Altitudes count only
 * where the altitude mode is `absolute`: the default, clampToGround, has none, and the others are not heights above sea
 * level. A blank gx:coord (a pause) begins a new stretch.
 */
export class KmlReader implements XmlReader {
  private readonly points: Points
  private readonly lines: Line[] = []
  private readonly rings: Line[] = []
  private readonly tracks: Line[] = []
  private readonly path: string[] = []
  private name: string | undefined
  private said = ''
  private saidFrom = ''
  private start = 0
  private segment = 0
  private where = ''
  private absolute = false
  private whens: number[] = []
  private coords = 0
  private pointCount = 0
  private innerRings = 0
  private clamped = 0
  private badHeights = 0
  private blanks = false
  private extra = 0

  /** @param bytes size of the file */
  constructor(
    private readonly place: XmlPlace,
    bytes: number,
  ) {
    this.points = new Points(roomFor(bytes, 4))
  }

  open(name: string): 'skip' | undefined {
    if (skipped.has(name)) return 'skip'
    this.path.push(name)
    this.said = ''
    if (name === 'coordinates') this.saidFrom = this.place.where()
    if (name === 'Placemark') this.name = undefined
    if (geometries.has(name)) this.begin()
    return undefined
  }

  private begin(): void {
    this.start = this.points.length
    this.segment = this.start
    this.where = this.place.where()
    this.absolute = false
    this.whens = []
    this.coords = 0
  }

  text(text: string): void {
    if (heard.has(this.path.at(-1) ?? '')) this.said += text
  }

  close(name: string): void {
    this.path.pop()
    const parent = this.path.at(-1)
    if (name === 'name' && parent === 'Placemark') this.name = tidyName(this.said)
    else if (name === 'altitudeMode') this.absolute = this.said.trim() === 'absolute'
    else if (name === 'when') this.whens.push(instant(this.said.trim()))
    else if (name === 'coord' && parent === 'Track') this.takeCoord(this.said.trim())
    else if (name === 'coordinates' && (parent === 'LineString' || parent === 'LinearRing')) this.takeTuples()
    else if (name === 'Point') this.pointCount++
    else if (name === 'LineString') this.end(this.lines)
    else if (name === 'LinearRing') this.endRing()
    else if (name === 'Track') this.endTrack()
    if (heard.has(name)) this.said = ''
  }

  private takeTuples(): void {
    const found = readTuples(this.said, this.points, this.saidFrom)
    if (found.problem) this.place.stop(found.problem)
    this.blanks ||= found.blanks
    this.extra += found.extra
  }

  private takeCoord(text: string): void {
    const time = this.coords++
    if (text === '') {
      this.cutTrack()
      return
    }
    const parts = text.split(/\s+/, 5)
    const where = this.place.where()
    const [lon, lat] = [decimal(parts[0] ?? ''), decimal(parts[1] ?? '')]
    if (Number.isNaN(lon)) {
      this.place.stop(numberProblem(parts[0] ?? '', 'longitude', where))
      return
    }
    if (Number.isNaN(lat)) {
      this.place.stop(numberProblem(parts[1] ?? '', 'latitude', where))
      return
    }
    if (!coordinateFits(lon, lat)) {
      this.place.stop(coordinateProblem(lon, lat, where))
      return
    }
    const height = decimal(parts[2] ?? '')
    if (Number.isNaN(height) && parts[2]) this.badHeights++
    this.points.push(lon, lat, height, time)
    if (this.points.length > mostPositions) this.place.stop(tooManyPositions(where))
  }

  private cutTrack(): void {
    if (this.points.length - this.segment >= 2) this.add(this.tracks, this.segment)
    this.segment = this.points.length
  }

  /** The n-th `when` belongs to the n-th `coord`, in whichever order they stand. */
  private endTrack(): void {
    for (let i = this.start; i < this.points.length; i++) {
      this.points.time[i] = this.whens[this.points.time[i]!] ?? Number.NaN
    }
    this.dropClampedHeights()
    this.cutTrack()
    this.whens = []
  }

  private endRing(): void {
    if (this.path.includes('innerBoundaryIs')) this.innerRings++
    else this.end(this.rings)
  }

  private end(lines: Line[]): void {
    this.dropClampedHeights()
    if (this.points.length - this.start >= 2) this.add(lines, this.start)
  }

  private add(lines: Line[], start: number): void {
    lines.push({ start, end: this.points.length, where: this.where, ...(this.name && { name: this.name }) })
  }

  private dropClampedHeights(): void {
    if (this.absolute) return
    for (let i = this.start; i < this.points.length; i++) {
      const height = this.points.height[i]!
      if (height !== 0 && !Number.isNaN(height)) this.clamped++
      this.points.height[i] = Number.NaN
    }
  }

  /** What the whole file came to: lines before tracks before rings. */
  result(): Reading {
    const lines = [this.lines, this.tracks, this.rings].find((some) => some.length > 0)
    if (!lines) return { ok: false, problems: [this.noLine()] }
    const warnings: Problem[] = []
    if (this.pointCount > 0) {
      warnings.push(problem('points-ignored', leftOut(this.pointCount, 'point')))
    }
    if (lines !== this.rings && this.rings.length > 0) {
      const says = `The file also holds ${several(this.rings.length, 'area')}. Only its lines are read.`
      warnings.push(problem('polygons-left-out', says))
    }
    if (lines === this.lines && this.tracks.length > 0) {
      const says = `The file also holds ${several(this.tracks.length, 'recorded track')}. Only its drawn lines are read.`
      warnings.push(problem('segments-left-out', says))
    }
    if (lines === this.rings && this.innerRings > 0) {
      const says = `The area has ${several(this.innerRings, 'inner ring')}. Only the outer one is read.`
      warnings.push(problem('inner-rings-left-out', says))
    }
    warnings.push(...this.repairs())
    const kind = lines === this.tracks ? 'trace' : 'drawing'
    return { ok: true, content: { points: this.points, lines, kind, heightDatum: 'sea-level' }, warnings }
  }

  private repairs(): Problem[] {
    const found: Problem[] = []
    if (this.clamped > 0) {
      const says = `${several(this.clamped, 'height is', 'heights are')} left out: the file lays the line on the ground. Set its altitude mode to absolute to keep them.`
      found.push(problem('heights-left-out', says))
    }
    if (this.badHeights > 0) found.push(heightsLeftOut(this.badHeights))
    if (this.blanks) {
      found.push(
        problem(
          'blanks-in-coordinates',
          'Blanks stand next to the commas of the coordinates. They are read all the same.',
        ),
      )
    }
    if (this.extra > 0) {
      found.push(extraValues(this.extra))
    }
    return found
  }

  private noLine(): Problem {
    const says =
      this.pointCount > 0
        ? `The file holds ${several(this.pointCount, 'point')} and no line. Bring the line of the centreline or of a lap.`
        : 'The file holds no line. Bring the line of the centreline or of a lap.'
    return problem('no-line', says)
  }
}
