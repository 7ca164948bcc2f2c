import type { JsonCursor } from '~/track/read/json'
import type { Points } from '~/track/read/points'

/** Positions that stand side by side in one array. */
export interface Run {
  readonly start: number
  readonly end: number
  /** Number of the array that holds the run: the runs of one polygon share it. */
  readonly parent: number
}

/** What a `coordinates` member holds, the positions themselves in the shared columns. */
export interface Coordinates {
  /** Arrays around each position: 0 for a Point, 1 for a LineString, 2 for a Polygon, 3 for a MultiPolygon. NaN where they differ. */
  level: number
  readonly runs: Run[]
  /** First position that is no two finite numbers, counted from 1 within these coordinates. */
  broken?: { readonly position: number; readonly why: 'short' | 'not-numbers' }
  /** Positions with a fourth value, and with a third that is no number. */
  extra: number
  heightless: number
  /** Arrays around the deepest empty array: an empty position of a LineString gives 1. -1 where there is none. */
  emptyLevel: number
}

/** A GeoJSON object as read: only the members that a line hangs on. */
export interface Node {
  type?: string
  name?: string
  coordinates?: Coordinates
  geometry?: Node
  geometries?: Node[]
  features?: Node[]
  /** Number of values in `bbox`; NaN where it is no list of numbers. */
  bbox?: number
  crs?: string
  /** Which of `tellingMembers` it has: bit i for the i-th. */
  members: number
}

/** Members that an object of one sort or another may not have (RFC 7946, 7.1). */
export const tellingMembers = ['coordinates', 'geometry', 'geometries', 'features', 'properties']

export const hasMember = (node: Node, member: string) => (node.members & (1 << tellingMembers.indexOf(member))) !== 0

/** Reads one GeoJSON object, in whatever order its members stand. */
export function readNode(json: JsonCursor, points: Points): Node {
  const node: Node = { members: 0 }
  json.members((key) => {
    const telling = tellingMembers.indexOf(key)
    if (telling !== -1) node.members |= 1 << telling
    if (key === 'type' && json.isString()) node.type = json.string()
    else if (key === 'name' && json.isString()) node.name ??= json.string()
    else if (key === 'coordinates' && json.isArray()) node.coordinates = readCoordinates(json, points)
    else if (key === 'geometry' && json.isObject()) node.geometry = readNode(json, points)
    else if (key === 'geometries' && json.isArray()) node.geometries = readNodes(json, points)
    else if (key === 'features' && json.isArray()) node.features = readNodes(json, points)
    else if (key === 'properties' && json.isObject()) node.name = readName(json) ?? node.name
    else if (key === 'bbox') node.bbox = readBox(json)
    else if (key === 'crs' && json.isObject()) node.crs = readReferenceSystem(json)
    else json.skip()
  })
  return node
}

function readNodes(json: JsonCursor, points: Points): Node[] {
  const nodes: Node[] = []
  json.elements(() => {
    if (json.isObject()) nodes.push(readNode(json, points))
    else {
      json.skip()
      nodes.push({ members: 0 })
    }
  })
  return nodes
}

function readName(json: JsonCursor): string | undefined {
  let name: string | undefined
  json.members((key) => {
    if (key === 'name' && json.isString()) name = json.string()
    else json.skip()
  })
  return name
}

function readReferenceSystem(json: JsonCursor): string {
  let name: string | undefined
  json.members((key) => {
    if (key === 'properties' && json.isObject()) name = readName(json)
    else json.skip()
  })
  return name ?? 'without a name'
}

function readBox(json: JsonCursor): number {
  if (!json.isArray()) {
    json.skip()
    return Number.NaN
  }
  let length = 0
  json.elements(() => {
    length += json.isNumber() ? 1 : Number.NaN
    json.skip()
  })
  return length
}

function readCoordinates(json: JsonCursor, points: Points): Coordinates {
  const found: Coordinates = { level: -1, runs: [], extra: 0, heightless: 0, emptyLevel: -1 }
  const first = points.length
  let parents = 0
  const note = (level: number) => {
    found.level = found.level === -1 || found.level === level ? level : Number.NaN
  }
  const list = (level: number, parent: number) => {
    const start = points.length
    const self = ++parents
    json.elements(() => {
      if (!json.isArray()) {
        json.skip()
        note(Number.NaN)
      } else if (isList(json.peekInside())) {
        if (json.peekInside() === 93) found.emptyLevel = Math.max(found.emptyLevel, level)
        list(level + 1, self)
      } else {
        note(level)
        readPosition(json, points, found, first)
      }
    })
    if (points.length > start && found.level === level) found.runs.push({ start, end: points.length, parent })
  }
  if (isList(json.peekInside())) list(1, 0)
  else {
    note(0)
    readPosition(json, points, found, first)
  }
  return found
}

/** Whether an array that begins with this character holds arrays, or nothing. */
const isList = (inside: number) => inside === 91 || inside === 93

function readPosition(json: JsonCursor, points: Points, found: Coordinates, first: number): void {
  let values = 0
  let numbers = true
  let lon = Number.NaN
  let lat = Number.NaN
  let height = Number.NaN
  json.elements(() => {
    let value = Number.NaN
    if (json.isNumber()) value = json.number()
    else json.skip()
    values++
    if (values === 1) lon = value
    else if (values === 2) lat = value
    else if (values === 3) height = Number.isFinite(value) ? value : Number.NaN
    if (values <= 2 && !Number.isFinite(value)) numbers = false
  })
  points.push(lon, lat, height)
  if (values > 3) found.extra++
  if (values >= 3 && Number.isNaN(height)) found.heightless++
  if (values < 2 || !numbers) {
    found.broken ??= { position: points.length - first, why: values < 2 ? 'short' : 'not-numbers' }
  }
}
