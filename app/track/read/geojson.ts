import { hasMember, type Node, type Run, readNode } from '~/track/read/geojson-nodes'
import { JsonCursor, jsonSizeProblem } from '~/track/read/json'
import { extraValues, heightsLeftOut, leftOut } from '~/track/read/notes'
import { coordinateFits, coordinateProblem } from '~/track/read/numbers'
import { type Content, type Line, Points, type Reading, roomFor, tidyName } from '~/track/read/points'
import { type Problem, problem, quoted, several } from '~/track/read/problems'

const geometryLevels: ReadonlyMap<string, number> = new Map([
  ['Point', 0],
  ['MultiPoint', 1],
  ['LineString', 1],
  ['MultiLineString', 2],
  ['Polygon', 2],
  ['MultiPolygon', 3],
])
const types = [...geometryLevels.keys(), 'GeometryCollection', 'Feature', 'FeatureCollection']

/** Members that RFC 7946, 7.1 keeps out of an object of each sort. */
const featureMayNot = ['coordinates', 'geometries', 'features']
const collectionMayNot = ['coordinates', 'geometries', 'geometry', 'properties']
const geometryMayNot = ['geometry', 'properties', 'features']

/**
 * Reads a GeoJSON text (RFC 7946): every LineString, MultiLineString, Polygon and MultiPolygon, however deep in features
 * and collections. Points are passed over. Where there are lines, polygons are left out.
 */
export function readGeoJson(text: string): Reading {
  const tooLarge = jsonSizeProblem(text)
  if (tooLarge) return { ok: false, problems: [tooLarge] }
  const json = new JsonCursor(text)
  const points = new Points(roomFor(text.length, 6))
  if (json.isArray()) {
    const says = 'The file holds a list. GeoJSON is one object, such as a Feature or a FeatureCollection.'
    return { ok: false, problems: [problem('not-geojson', says, 'line 1')] }
  }
  const root = readNode(json, points)
  json.end()
  if (json.fault) return { ok: false, problems: [json.fault] }
  const collector = new Collector(points)
  collector.take(root, '')
  if (collector.problem) return { ok: false, problems: [collector.problem] }
  return collector.result(root)
}

/** Goes through the objects of a file and gathers its lines. */
class Collector {
  problem: Problem | undefined
  private readonly lines: Line[] = []
  private readonly rings: Line[] = []
  private readonly warnings: Problem[] = []
  private readonly unfit: Problem[] = []
  private pointCount = 0
  private innerRings = 0
  private extra = 0
  private heightless = 0

  constructor(private readonly points: Points) {}

  take(node: Node, where: string, name?: string): void {
    if (this.problem) return
    if (node.type === undefined || !types.includes(node.type)) {
      this.problem = typeProblem(node.type, where)
      return
    }
    this.check(node, where)
    const at = (what: string, i: number) => (where === '' ? `${what} ${i + 1}` : `${where}, ${what} ${i + 1}`)
    if (node.type === 'FeatureCollection') {
      if (!node.features) this.problem = shapeProblem('A FeatureCollection needs a list of features.', where)
      for (const [i, feature] of (node.features ?? []).entries()) this.take(feature, at('feature', i))
    } else if (node.type === 'Feature') {
      if (node.geometry) this.take(node.geometry, where, node.name)
    } else if (node.type === 'GeometryCollection') {
      if (!node.geometries) this.problem = shapeProblem('A GeometryCollection needs a list of geometries.', where)
      for (const [i, geometry] of (node.geometries ?? []).entries()) this.take(geometry, at('geometry', i), name)
    } else this.takeGeometry(node, where, tidyName(name ?? node.name))
  }

  private check(node: Node, where: string): void {
    const mayNot =
      node.type === 'Feature' ? featureMayNot : node.type === 'FeatureCollection' ? collectionMayNot : geometryMayNot
    const stray = mayNot.find((member) => hasMember(node, member))
    if (stray) {
      const says = `GeoJSON does not allow “${stray}” in a ${node.type}. It is left out.`
      this.warnOnce(problem('member-not-allowed', says, where || undefined))
    }
    if (node.bbox !== undefined && node.bbox !== 4 && node.bbox !== 6) {
      const says = 'A bbox holds four numbers, or six with heights; this one does not. It is left out.'
      this.warnOnce(problem('bbox-ignored', says, where || undefined))
    }
    if (node.crs !== undefined && !/CRS:?84$/.test(node.crs)) {
      const says = `The file names the reference system ${quoted(node.crs)}. It is read as WGS 84 longitude and latitude.`
      this.warnOnce(problem('crs-ignored', says, where || undefined))
    }
  }

  private warnOnce(warning: Problem): void {
    if (!this.warnings.some((other) => other.code === warning.code)) this.warnings.push(warning)
  }

  private takeGeometry(node: Node, where: string, name: string | undefined): void {
    const { type, coordinates } = node
    if (!coordinates) {
      this.problem = shapeProblem(`A ${type} needs a list of coordinates.`, where)
      return
    }
    if (type === 'Point' || type === 'MultiPoint') {
      this.pointCount += coordinates.runs.reduce((sum, run) => sum + run.end - run.start, type === 'Point' ? 1 : 0)
      return
    }
    const level = geometryLevels.get(type!)!
    if (coordinates.level !== level && coordinates.level !== -1) {
      this.problem = shapeProblem(`The coordinates of a ${type} are ${nesting[level]}; these are not.`, where)
      return
    }
    if (coordinates.emptyLevel === level) {
      const says = 'A position is empty. It needs a longitude and a latitude. Add them or take it out.'
      this.problem = problem('coordinates-missing', says, where || undefined)
      return
    }
    if (coordinates.broken) {
      const { position, why } = coordinates.broken
      const place = joined(where, `position ${position}`)
      this.problem =
        why === 'short'
          ? problem(
              'coordinates-missing',
              'A position needs a longitude and a latitude. Add them or take it out.',
              place,
            )
          : problem(
              'not-a-number',
              'A coordinate here is not a finite number. Correct it or take the position out.',
              place,
            )
      return
    }
    this.extra += coordinates.extra
    this.heightless += coordinates.heightless
    if (type === 'LineString' || type === 'MultiLineString') this.takeLines(coordinates.runs, type, where, name)
    else this.takeRings(coordinates.runs, where, name)
  }

  private takeLines(runs: readonly Run[], type: string, where: string, name: string | undefined): void {
    if (runs.length === 0) this.unfit.push(tooShort(where))
    runs.forEach((run, i) => {
      const place = type === 'LineString' ? where : joined(where, `line ${i + 1}`)
      if (run.end - run.start < 2) this.unfit.push(tooShort(place))
      else if (this.fits(run, place)) this.lines.push({ start: run.start, end: run.end, ...named(name, place) })
    })
  }

  private takeRings(runs: readonly Run[], where: string, name: string | undefined): void {
    const seen = new Set<number>()
    runs.forEach((run, i) => {
      const place = runs.length === 1 ? where : joined(where, `ring ${i + 1}`)
      if (seen.has(run.parent)) this.innerRings++
      else if (run.end - run.start < 4) {
        const says = 'A ring needs at least four positions, the last the same as the first. Draw the line again.'
        this.unfit.push(problem('ring-too-short', says, place || undefined))
      } else if (this.fits(run, place)) this.rings.push({ start: run.start, end: run.end, ...named(name, place) })
      seen.add(run.parent)
    })
  }

  private fits(run: Run, place: string): boolean {
    const { lon, lat } = this.points
    for (let i = run.start; i < run.end; i++) {
      if (coordinateFits(lon[i]!, lat[i]!)) continue
      this.problem ??= coordinateProblem(lon[i]!, lat[i]!, joined(place, `position ${i - run.start + 1}`))
      return false
    }
    return true
  }

  result(root: Node): Reading {
    const lines = this.lines.length > 0 ? this.lines : this.rings
    if (lines.length === 0) {
      const says =
        this.pointCount > 0
          ? `The file holds ${several(this.pointCount, 'point')} and no line. Bring the line of the centreline or of a lap.`
          : 'The file holds no line. Bring the line of the centreline or of a lap.'
      return { ok: false, problems: this.unfit.length > 0 ? this.unfit.slice(0, 5) : [problem('no-line', says)] }
    }
    const warnings = [...this.warnings, ...this.unfit.slice(0, 5), ...this.leftOut(lines)]
    const name = root.type === 'FeatureCollection' ? tidyName(root.name) : undefined
    const content: Content = {
      points: this.points,
      lines,
      kind: 'drawing',
      heightDatum: 'ellipsoid',
      ...(name && { name }),
    }
    return { ok: true, content, warnings }
  }

  private leftOut(lines: readonly Line[]): Problem[] {
    const found: Problem[] = []
    if (this.pointCount > 0) {
      found.push(problem('points-ignored', leftOut(this.pointCount, 'point')))
    }
    if (lines === this.lines && this.rings.length > 0) {
      const says = `The file also holds ${several(this.rings.length, 'area')}. Only its lines are read.`
      found.push(problem('polygons-left-out', says))
    }
    if (lines === this.rings && this.innerRings > 0) {
      const says = `The area has ${several(this.innerRings, 'inner ring')}. Only the outer one is read.`
      found.push(problem('inner-rings-left-out', says))
    }
    if (this.extra > 0) {
      found.push(extraValues(this.extra))
    }
    if (this.heightless > 0) {
      found.push(heightsLeftOut(this.heightless))
    }
    return found
  }
}

const nesting = ['one position', 'a list of positions', 'lists of positions', 'lists of rings'] as const

const joined = (where: string, place: string) => (where === '' ? place : `${where}, ${place}`)

const named = (name: string | undefined, where: string) => ({ ...(name && { name }), ...(where !== '' && { where }) })

const shapeProblem = (says: string, where: string) =>
  problem('geojson-shape', `${says} Save the file again from where it came.`, where || undefined)

const tooShort = (where: string) =>
  problem('line-too-short', 'A line needs at least two positions. Draw it again.', where || undefined)

function typeProblem(type: string | undefined, where: string): Problem {
  const place = where || undefined
  const meant = types.find((known) => known.toLowerCase() === type?.toLowerCase())
  if (meant) {
    return problem(
      'unknown-type',
      `The type ${quoted(type!)} is written “${meant}” in GeoJSON. Capital letters count.`,
      place,
    )
  }
  const says =
    type === undefined
      ? 'The object has no type. GeoJSON is a Feature, a FeatureCollection or a geometry such as LineString.'
      : `GeoJSON has no type ${quoted(type)}. It has Feature, FeatureCollection and geometries such as LineString.`
  return problem(type === undefined && where === '' ? 'not-geojson' : 'unknown-type', says, place)
}
