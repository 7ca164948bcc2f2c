/** A ring's segments by the square cells they pass through, so that the nearest one is found without looking at all. */
export interface SegmentGrid {
  readonly cell: number
  readonly x0: number
  readonly y0: number
  readonly columns: number
  readonly rows: number
  /** Cell c's segments are `segments[starts[c]]` up to, not including, `segments[starts[c + 1]]`. */
  readonly starts: Int32Array
  readonly segments: Int32Array
}

const leastCell = 25
const mostCells = 65_536
const nearRings = 8

/** Calls `visit` with each cell that segment (ax, ay)–(bx, by) passes through, row by row, each once. */
function eachCell(
  grid: Pick<SegmentGrid, 'cell' | 'x0' | 'y0' | 'columns' | 'rows'>,
  [ax, ay, bx, by]: readonly [number, number, number, number],
  visit: (cell: number) => void,
) {
  const column = (x: number) => Math.min(grid.columns - 1, Math.max(0, Math.floor((x - grid.x0) / grid.cell)))
  const row = (y: number) => Math.min(grid.rows - 1, Math.max(0, Math.floor((y - grid.y0) / grid.cell)))
  const [lowX, lowY, highX, highY] = ay <= by ? [ax, ay, bx, by] : [bx, by, ax, ay]
  const slope = (highX - lowX) / (highY - lowY)
  const xAt = (y: number) => (y <= lowY ? lowX : y >= highY ? highX : lowX + slope * (y - lowY))
  for (let r = row(lowY); r <= row(highY); r++) {
    const enter = xAt(grid.y0 + r * grid.cell)
    const leave = xAt(grid.y0 + (r + 1) * grid.cell)
    const last = column(Math.max(enter, leave))
    for (let c = column(Math.min(enter, leave)); c <= last; c++) visit(r * grid.columns + c)
  }
}

/**
 * Index of the closed ring with vertices (x, y) in metres: segment i runs from vertex i to the next, the last one back to
 * the first. Cells are 25 m wide, wider where the ring's box would need more than 65,536 of them.
 */
export function makeSegmentGrid(x: Float64Array, y: Float64Array): SegmentGrid {
  const n = x.length
  const x0 = x.reduce((least, value) => Math.min(least, value), Infinity)
  const y0 = y.reduce((least, value) => Math.min(least, value), Infinity)
  const width = x.reduce((most, value) => Math.max(most, value), -Infinity) - x0
  const height = y.reduce((most, value) => Math.max(most, value), -Infinity) - y0
  const cell = Math.max(leastCell, Math.sqrt((width * height) / mostCells), (width + height) / mostCells)
  const columns = Math.floor(width / cell) + 1
  const rows = Math.floor(height / cell) + 1
  const frame = { cell, x0, y0, columns, rows }
  const starts = new Int32Array(columns * rows + 1)
  const ends = (i: number) => [x[i]!, y[i]!, x[(i + 1) % n]!, y[(i + 1) % n]!] as const
  for (let i = 0; i < n; i++) {
    eachCell(frame, ends(i), (c) => {
      starts[c + 1]!++
    })
  }
  for (let c = 0; c < columns * rows; c++) starts[c + 1]! += starts[c]!
  const segments = new Int32Array(starts[columns * rows]!)
  const next = starts.slice()
  for (let i = 0; i < n; i++) {
    eachCell(frame, ends(i), (c) => {
      segments[next[c]!++] = i
    })
  }
  return { ...frame, starts, segments }
}

/**
 * The segment nearest to (px, py), by `distance` squared to segment i. Looks outward from the point's cell, ring by ring,
 * until no cell further out can hold a nearer one; far from the ring it looks at every segment.
 */
export function nearestSegment(
  grid: SegmentGrid,
  px: number,
  py: number,
  count: number,
  distance: (segment: number) => number,
): number {
  const u = (px - grid.x0) / grid.cell
  const v = (py - grid.y0) / grid.cell
  const column = Math.floor(u)
  const row = Math.floor(v)
  const toEdge = grid.cell * Math.min(u - column, column + 1 - u, v - row, row + 1 - v)
  let best = -1
  let least = Infinity
  for (let ring = 0; ring <= nearRings; ring++) {
    for (let r = row - ring; r <= row + ring; r++) {
      if (r < 0 || r >= grid.rows) continue
      const step = r === row - ring || r === row + ring || ring === 0 ? 1 : 2 * ring
      for (let c = column - ring; c <= column + ring; c += step) {
        if (c < 0 || c >= grid.columns) continue
        const cell = r * grid.columns + c
        for (let k = grid.starts[cell]!; k < grid.starts[cell + 1]!; k++) {
          const d = distance(grid.segments[k]!)
          if (d < least) {
            least = d
            best = grid.segments[k]!
          }
        }
      }
    }
    const certain = ring * grid.cell + toEdge
    if (least <= certain * certain) return best
  }
  best = 0
  least = Infinity
  for (let i = 0; i < count; i++) {
    const d = distance(i)
    if (d < least) {
      least = d
      best = i
    }
  }
  return best
}
