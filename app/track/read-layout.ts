import { readCsv } from '~/track/read/csv'
import { readGeoJson } from '~/track/read/geojson'
import { GpxReader, gpxNamespaces } from '~/track/read/gpx'
import { joinPieces, type Piece } from '~/track/read/join'
import { judge } from '~/track/read/judge'
import { KmlReader, kmlNamespaces } from '~/track/read/kml'
import { chooseLap, type Lap } from '~/track/read/laps'
import { type Content, type HeightDatum, Points, type Reading } from '~/track/read/points'
import { count, nameFile, type Problem, problem } from '~/track/read/problems'
import { type Format, formatWords, type OpenedFile, openFile } from '~/track/read/text'
import { walkXml } from '~/track/read/xml'
import { type LngLat, type Metres, metres, type Position } from '~/track/units'

export type { Piece } from '~/track/read/join'
export type { Lap } from '~/track/read/laps'
export type { HeightDatum } from '~/track/read/points'
export type { Problem, Remedy } from '~/track/read/problems'
export { largestFile } from '~/track/read/text'

/** Road from the line to its right and left edge in metres, in the order the file draws. */
export interface RoadWidth {
  readonly right: Metres
  readonly left: Metres
}

/** A circuit's line as a file gives it. */
export interface Layout {
  readonly name?: string
  /** A ring in the order the file draws, the first position not repeated at the end. Heights in metres where the file has them. */
  readonly positions: readonly Position[]
  /** One for each position, where the file has them. */
  readonly widths?: readonly RoadWidth[]
  /** What the heights are measured from, where the format says so. */
  readonly heightDatum?: HeightDatum
}

/** What a file offers to choose from; the choice goes back in as an option. */
export interface Offers {
  /** Laps of a trace, in the order driven, and the number of the one taken. */
  readonly laps?: readonly Lap[]
  readonly lapTaken?: number
  /** Pieces of a drawing, in the file's order. */
  readonly pieces?: readonly Piece[]
}

export type LayoutReading =
  | ({
      readonly ok: true
      readonly format: Format
      readonly layout: Layout
      readonly warnings: readonly Problem[]
    } & Offers)
  | ({ readonly ok: false; readonly problems: readonly Problem[] } & Offers)

/** Remedies that a person has chosen. */
export interface ReadOptions {
  /** Where on the globe the point x = 0, y = 0 of a file in metres lies; x goes east, y north. */
  readonly anchor?: LngLat
  /** Number of the lap to take, from 1. */
  readonly lap?: number
  /** Numbers of the pieces to join, from 1. */
  readonly pieces?: readonly number[]
  /** Whether to close a gap of 60 m or more with a straight. */
  readonly close?: boolean
}

/**
 * Reads the line of a circuit from the bytes of a GeoJSON, GPX, KML or CSV file. Any bytes end in an answer: a layout with
 * warnings of what was repaired or left out, or the problems that stand in the way, each naming the file, the place and
 * the remedy. A file holds at most 20 MB and 1,000,000 positions; a line of more than 20,000 is thinned to one position
 * each half metre. Nothing is thrown.
 */
export function readLayout(bytes: Uint8Array, fileName: string, options: ReadOptions = {}): LayoutReading {
  const opened = openFile(bytes, fileName)
  if ('code' in opened) return refused(fileName, [opened])
  const { format, reading } = readContent(opened, options)
  if (!reading.ok) return refused(fileName, reading.problems)
  const chosen = chooseLine(reading.content, options)
  if ('code' in chosen) return refused(fileName, [chosen])
  const judged = judge(chosen.points, { isLap: chosen.isLap, close: options.close ?? false })
  if (!judged.ok) return refused(fileName, judged.problems, chosen.offers)
  const name = chosen.name ?? reading.content.name
  return {
    ok: true,
    format,
    layout: layoutOf(judged.points, name, reading.content.heightDatum),
    warnings: [...opened.warnings, ...reading.warnings, ...chosen.warnings, ...judged.warnings].map((warning) =>
      nameFile(fileName, warning),
    ),
    ...chosen.offers,
  }
}

function refused(fileName: string, problems: readonly Problem[], offers: Offers = {}): LayoutReading {
  return { ok: false, problems: problems.map((found) => nameFile(fileName, found)), ...offers }
}

function readContent(file: OpenedFile, options: ReadOptions): { format: Format; reading: Reading } {
  if (file.family === 'xml') return readXml(file)
  const text = file.decoder.decode(file.body)
  if (file.family === 'json') return { format: 'geojson', reading: readGeoJson(text) }
  return { format: 'csv', reading: readCsv(text, options.anchor) }
}

/** GPX or KML, as the root element says. */
function readXml(file: OpenedFile): { format: Format; reading: Reading } {
  let format: Format = file.promised ?? 'gpx'
  let reader: GpxReader | KmlReader | undefined
  const found = walkXml(file.body, file.decoder, [...gpxNamespaces, ...kmlNamespaces], (root, place) => {
    if (root !== 'gpx' && root !== 'kml') return notTheRoot(root, file.promised)
    if (file.promised && root !== file.promised) {
      const says = `The name says ${formatWords[file.promised]}, but the file holds ${formatWords[root]}. Give it the ending .${root}.`
      return problem('not-the-format', says)
    }
    format = root
    reader = root === 'gpx' ? new GpxReader(place, file.body.length) : new KmlReader(place, file.body.length)
    return reader
  })
  if (found || !reader) return { format, reading: { ok: false, problems: found ? [found] : [] } }
  return { format, reading: reader.result() }
}

function notTheRoot(root: string, promised: Format | undefined): Problem {
  const holds = root.toLowerCase() === 'html' ? 'a web page' : `an XML document of another kind, “${root.slice(0, 40)}”`
  const says = promised
    ? `The name says ${formatWords[promised]}, but the file holds ${holds}. Save it again from where it came.`
    : `The file holds ${holds}. A circuit comes as GeoJSON, GPX, KML or CSV.`
  return problem('not-the-format', says)
}

/** Most pieces, or stretches of a trace, that a line may come in. */
const mostPieces = 5000

interface ChosenLine {
  readonly points: Points
  readonly name?: string
  readonly isLap: boolean
  readonly offers: Offers
  readonly warnings: readonly Problem[]
}

/** One line of a file's content: a lap of a trace, or the pieces of a drawing joined. */
function chooseLine(content: Content, options: ReadOptions): ChosenLine | Problem {
  if (content.lines.length > mostPieces) {
    const says = `The line comes in ${count(content.lines.length)} pieces; at most ${count(mostPieces)} are read. Save the circuit's line alone.`
    return problem('too-many-pieces', says)
  }
  const lap = content.kind === 'trace' ? chooseLap(content, options.lap) : undefined
  if (lap && 'code' in lap) return lap
  if (!lap) {
    const joined = joinPieces(content, options.pieces)
    if ('code' in joined) return joined
    const { points, name, pieces, warnings } = joined
    return { points, ...(name && { name }), isLap: false, offers: pieces ? { pieces } : {}, warnings }
  }
  const points = new Points(lap.end - lap.start, content.points.hasWidths)
  for (let i = lap.start; i < lap.end; i++) points.copy(content.points, i)
  const offers = lap.laps ? { laps: lap.laps, lapTaken: lap.lapTaken! } : {}
  return { points, ...(lap.name && { name: lap.name }), isLap: lap.isLap, offers, warnings: lap.warnings }
}

function layoutOf(points: Points, name: string | undefined, heightDatum: HeightDatum | undefined): Layout {
  const { lon, lat, height, right, left, length } = points
  const positions: Position[] = []
  const widths: RoadWidth[] = []
  let heights = 0
  for (let i = 0; i < length; i++) {
    const hasHeight = !Number.isNaN(height[i]!)
    if (hasHeight) heights++
    positions.push(hasHeight ? [lon[i]!, lat[i]!, height[i]!] : [lon[i]!, lat[i]!])
    if (points.hasWidths) widths.push({ right: metres(right[i]!), left: metres(left[i]!) })
  }
  return {
    ...(name && { name }),
    positions,
    ...(points.hasWidths && { widths }),
    ...(heights > 0 && heightDatum && { heightDatum }),
  }
}
