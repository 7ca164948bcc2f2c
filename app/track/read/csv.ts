import { makePlane } from '~/track/plane'
import { type Columns, columnsOf } from '~/track/read/csv-columns'
import { CsvRows, type Row } from '~/track/read/csv-table'
import { decimalCommas, heightsLeftOut, tooManyPositions } from '~/track/read/notes'
import {
  coordinateFits,
  coordinateProblem,
  decimal,
  decimalWithComma,
  hasDecimalComma,
  instant,
  numberProblem,
} from '~/track/read/numbers'
import { mostPositions, Points, type Reading, roomFor } from '~/track/read/points'
import { inMetres, type Problem, problem, quoted } from '~/track/read/problems'
import type { LngLat } from '~/track/units'

const delimiters = [',', ';', '\t', '|']
/** Rows looked at for the one that names the columns. */
const headerRows = 100
/** Farthest a metre file may reach from its anchor, and widest road to one side, in metres. */
const farthest = 30_000
const widest = 200

interface Header {
  readonly columns: Columns
  readonly delimiter: string
}

/**
 * Reads a CSV text: columns found by the names in its header. Longitude and latitude in degrees, or x and y in metres
 * east and north of `anchor`; height, time and the road's width right and left where there are such columns. Lines that
 * begin with a number sign are comments, except one that is the header. The delimiter is the one in which the header makes
 * sense. A first line "sep=;" fixes it.
 */
export function readCsv(text: string, anchor?: LngLat): Reading {
  const rows = new CsvRows(text)
  const header = findHeader(rows)
  if ('code' in header) return { ok: false, problems: [header] }
  const { columns } = header
  if (columns.metric && !anchor) {
    const says =
      'The file gives metres, not longitude and latitude. Give the position on the globe of its point x = 0, y = 0.'
    return { ok: false, problems: [problem('anchor-needed', says, undefined, 'give-anchor')] }
  }
  if (columns.metric && anchor && !coordinateFits(anchor[0], anchor[1])) {
    const says =
      'The anchor is no place on the globe. Give its longitude from −180 to 180 and its latitude from −90 to 90.'
    return { ok: false, problems: [problem('anchor-out-of-range', says, undefined, 'give-anchor')] }
  }
  const reader = new RowReader(header, anchor, text.length)
  let row = rows.next(header.delimiter)
  if (row && reader.isUnits(row)) row = rows.next(header.delimiter)
  for (; row && !reader.problem; row = rows.next(header.delimiter)) reader.take(row)
  const found = reader.problem ?? rows.problem
  return found ? { ok: false, problems: [found] } : reader.result()
}

function findHeader(rows: CsvRows): Header | Problem {
  let fixed: string | undefined
  let firstRow: Row | undefined
  for (let i = 0; i < headerRows; i++) {
    const here = rows.place()
    const line = rows.next('\0', true)
    if (!line) break
    const separator = i === 0 ? /^sep=(.)$/i.exec(line.raw)?.[1] : undefined
    if (separator) {
      fixed = separator
      continue
    }
    firstRow ??= line.raw.startsWith('#') ? undefined : line
    for (const delimiter of fixed ? [fixed] : delimiters) {
      rows.back(here)
      const row = rows.next(delimiter, true)
      const columns = row && columnsOf(row.fields.map((field, k) => (k === 0 ? field.replace(/^#\s*/, '') : field)))
      if (columns) return { columns, delimiter }
    }
  }
  if (rows.problem) return rows.problem
  const says = `No row names the columns${firstRow ? `; the first is ${quoted(firstRow.raw)}` : ''}. Name them in a first line such as lon,lat,height, or x,y for metres.`
  return problem('no-header', says, `line ${firstRow?.line ?? 1}`)
}

/** Takes the data rows. */
class RowReader {
  problem: Problem | undefined
  private readonly points: Points
  private readonly columns: Columns
  private readonly toLngLat: ((x: number, y: number) => LngLat) | undefined
  private commas = 0
  private badHeights = 0

  constructor({ columns }: Header, anchor: LngLat | undefined, letters: number) {
    this.columns = columns
    this.points = new Points(roomFor(letters, 4), columns.right !== undefined)
    const plane = columns.metric && anchor ? makePlane([anchor]) : undefined
    this.toLngLat = plane && ((x, y) => plane.toLngLat({ x, y }))
  }

  /** Whether a row names units instead of holding numbers. */
  isUnits({ fields }: Row): boolean {
    const isWord = (text: string | undefined) =>
      /^[^\d]+$/.test(text ?? '') && !/^\W*(nan|inf|null|none|na)/i.test(text!)
    return isWord(fields[this.columns.first]) && isWord(fields[this.columns.second])
  }

  take(row: Row): void {
    const { columns } = this
    const a = this.required(row, columns.first, columns.metric ? 'x' : 'longitude')
    const b = this.required(row, columns.second, columns.metric ? 'y' : 'latitude')
    const right = this.width(row, columns.right)
    const left = this.width(row, columns.left)
    if (this.problem) return
    const [lon, lat] = this.toLngLat ? this.fromMetres(a, b, row) : [a, b]
    if (!this.problem && !coordinateFits(lon, lat)) this.problem = coordinateProblem(lon, lat, whereOf(row))
    this.points.push(lon, lat, this.height(row), this.time(row), right, left)
    if (this.points.length > mostPositions) this.problem = tooManyPositions(whereOf(row))
  }

  private fromMetres(x: number, y: number, row: Row): LngLat {
    if (Math.hypot(x, y) <= farthest) return this.toLngLat!(x, y)
    const says = `The point lies ${inMetres(Math.hypot(x, y))} from x = 0, y = 0. A circuit lies within ${inMetres(farthest)}. Bring metres from a point nearby.`
    this.problem ??= problem('out-of-range', says, whereOf(row))
    return [0, 0]
  }

  private number(text: string): number {
    const value = decimal(text)
    if (!Number.isNaN(value) || !hasDecimalComma(text)) return value
    this.commas++
    return decimalWithComma(text)
  }

  private required(row: Row, column: number, what: string): number {
    const text = row.fields[column] ?? ''
    const value = this.number(text)
    if (Number.isNaN(value)) this.problem ??= numberProblem(text, what, whereOf(row))
    return value
  }

  private width(row: Row, column: number | undefined): number {
    if (column === undefined) return Number.NaN
    const text = row.fields[column] ?? ''
    const value = this.number(text)
    if (Number.isNaN(value)) this.problem ??= numberProblem(text, 'width', whereOf(row))
    else if (value < 0 || value > widest) {
      const says = `The width ${value} is out of range: widths to one side run from 0 to ${widest}\u00A0m. Correct it.`
      this.problem ??= problem('width-out-of-range', says, whereOf(row))
    }
    return value
  }

  private height(row: Row): number {
    const text = this.columns.height === undefined ? '' : (row.fields[this.columns.height] ?? '')
    const value = this.number(text)
    if (text !== '' && Number.isNaN(value)) this.badHeights++
    return value
  }

  private time(row: Row): number {
    const { time } = this.columns
    const text = time ? (row.fields[time.column] ?? '') : ''
    const value = this.number(text)
    return time && !Number.isNaN(value) ? value * time.seconds : instant(text)
  }

  result(): Reading {
    if (this.points.length === 0) {
      return { ok: false, problems: [problem('no-line', 'The file names its columns and holds no row of numbers.')] }
    }
    const warnings: Problem[] = []
    if (this.commas > 0) warnings.push(decimalCommas())
    if (this.badHeights > 0) warnings.push(heightsLeftOut(this.badHeights))
    const kind = this.columns.metric ? 'drawing' : 'trace'
    return {
      ok: true,
      content: { points: this.points, lines: [{ start: 0, end: this.points.length }], kind },
      warnings,
    }
  }
}

const whereOf = (row: Row) => `line ${row.line}`
