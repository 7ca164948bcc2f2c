import type { TurnDirection } from '~/book/kinds'
import { type Box, type GroupShape, type Point, rect, text } from '~/draw/display-list'
import { boundsOf, insideRing, overlap } from '~/draw/lines'
import { numberWidth, PLATE_HEIGHT, type PlateCorner, plateField, plateGroup } from '~/draw/number-plate'
import type { Projection } from '~/draw/projection'
import type { Road } from '~/draw/road'
import { boxDistance2, grown, isFree, type Room } from '~/draw/room'
import { type Reader, textSize, textWidth } from '~/draw/text-styles'
import type { Station } from '~/track/units'

export interface PlatedCorner {
  corner: PlateCorner
  /** Where the corner is tightest, px. */
  apex: Point
  /** Direction from the apex to the outside of the bend, radians clockwise from the right. */
  outside: number
}

export interface Plate {
  corner: PlateCorner
  box: Box
  named: boolean
}

/** A corner where a plate is to be set: its apex in px, and the side of the road that its bend turns away from. */
export function platedCorner(
  corner: PlateCorner & { direction: TurnDirection; apex: Station },
  road: Road,
  projection: Projection,
): PlatedCorner {
  const apex = projection.toPx(road.at(corner.apex))
  // A heading of 0° points up the picture: what lies left of it lies at 180° from the right.
  const heading = (road.headingAt(corner.apex) * Math.PI) / 180
  return { corner, apex, outside: corner.direction === 'right' ? heading - Math.PI : heading }
}

const GAP = 5

function sizeOf(corner: PlateCorner, named: boolean, reader: Reader) {
  const name = named ? GAP + textWidth(corner.name, 'corner-name', textSize('corner-name', reader)) : 0
  return { width: numberWidth(corner.number) + name, height: PLATE_HEIGHT }
}

/** Ways from the outside direction, degrees, and what each costs; the inside of the bend comes last. */
const TURNS = [0, 20, -20, 40, -40, 60, -60, 80, -80, 180, 160, -160, 140, -140, 110, -110]
const REACH = 96
const STEP = 5
/** What it costs to lie nearer to another corner, and how much further from its corner a name may take a plate. */
const STRAY = 40
const NAME_WORTH = 34

interface Candidate {
  box: Box
  cost: number
}

/** Places for a box around an apex, cheapest first: near and outside before far and inside. */
function candidates({ apex, outside }: PlatedCorner, size: { width: number; height: number }, nearest: number) {
  const all: Candidate[] = []
  for (const turn of TURNS) {
    const angle = outside + (turn * Math.PI) / 180
    const cos = Math.cos(angle)
    const sin = Math.sin(angle)
    // How far the box reaches back towards the apex along this direction.
    const depth = (Math.abs(cos) * size.width + Math.abs(sin) * size.height) / 2
    for (let gap = 0; gap <= REACH; gap += STEP) {
      const distance = nearest + gap + depth
      const box = {
        x: apex[0] + cos * distance - size.width / 2,
        y: apex[1] + sin * distance - size.height / 2,
        ...size,
      }
      all.push({ box, cost: gap + Math.abs(turn) * 0.3 + (Math.abs(turn) > 90 ? 12 : 0) })
    }
  }
  return all.sort((a, b) => a.cost - b.cost)
}

/** Where a plate with its name would lie if nothing else were on the sheet. */
export const preferredBox = (plated: PlatedCorner, nearest: number, reader: Reader): Box =>
  candidates(plated, sizeOf(plated.corner, true, reader), nearest)[0]!.box

/** Ground under a plate that should stay legible, without forbidding it: what covering it altogether costs. */
export interface SoftGround {
  ring: readonly Point[]
  cost: number
}

/** Samples of a box's area. */
const SAMPLES = [0, 0.25, 0.5, 0.75, 1].flatMap((u) => [0, 1].map((v) => [u, v] as const))

function softCost(box: Box, soft: readonly (SoftGround & { bounds: Box })[]): number {
  let sum = 0
  for (const { ring, bounds, cost } of soft) {
    if (!overlap(bounds, box)) continue
    const covered = SAMPLES.filter(([u, v]) => insideRing([box.x + u * box.width, box.y + v * box.height], ring))
    sum += (cost * covered.length) / SAMPLES.length
  }
  return sum
}

interface Search {
  room: Room
  soft: readonly (SoftGround & { bounds: Box })[]
  /** px from the road's middle to the nearest a plate may come. */
  nearest: number
  apexes: readonly Point[]
}

/** A plate nearer to another corner than to its own would be read as that one's. */
function strayCost(box: Box, apex: Point, apexes: readonly Point[]): number {
  const own = boxDistance2(apex, box)
  return apexes.some((other) => other !== apex && boxDistance2(other, box) < own) ? STRAY : 0
}

function bestBox(plated: PlatedCorner, size: { width: number; height: number }, search: Search): Candidate | null {
  let best: Candidate | null = null
  for (const { box, cost } of candidates(plated, size, search.nearest)) {
    if (best && cost >= best.cost) break
    if (!isFree(box, search.room, 4)) continue
    const whole = cost + strayCost(box, plated.apex, search.apexes) + softCost(grown(box, 3), search.soft)
    if (!best || whole < best.cost) best = { box, cost: whole }
  }
  return best
}

/**
 * A number plate for every corner, outside its bend where there is room, never on the road, never on another plate; then the
 * name beside each number where that leaves the plate near its corner. A corner of which not even the number finds room
 * gets none. Deterministic: corners in the order given, the cheapest free place first.
 * @param nearest px from the road's middle to the nearest a plate may come
 */
export function placePlates(
  corners: readonly PlatedCorner[],
  room: Room,
  soft: readonly SoftGround[],
  nearest: number,
  reader: Reader,
): Plate[] {
  const search = {
    soft: soft.map((one) => ({ ...one, bounds: boundsOf(one.ring) })),
    nearest,
    apexes: corners.map(({ apex }) => apex),
  }
  const placed: { plated: PlatedCorner; box: Box; cost: number; named: boolean }[] = []
  const others = (index: number) => placed.filter((_, i) => i !== index).map(({ box }) => box)
  for (const plated of corners) {
    const size = sizeOf(plated.corner, false, reader)
    const found = bestBox(plated, size, { ...search, room: { ...room, boxes: [...room.boxes, ...others(-1)] } })
    if (found) placed.push({ plated, ...found, named: false })
  }
  for (const [i, { plated, cost }] of placed.entries()) {
    if (plated.corner.name === '') continue
    const free = { ...room, boxes: [...room.boxes, ...others(i)] }
    const found = bestBox(plated, sizeOf(plated.corner, true, reader), { ...search, room: free })
    if (found && found.cost <= cost + NAME_WORTH) placed[i] = { plated, ...found, named: true }
  }
  return placed.map(({ plated, box, named }) => ({ corner: plated.corner, box, named }))
}

/** A plate with its name and the room around it that a finger needs. */
export function plateShapes({ corner, box, named }: Plate, reader: Reader): GroupShape {
  const nameAt: Point = [box.x + numberWidth(corner.number) + GAP, box.y + 14.5]
  return plateGroup(corner, [
    rect('target', grown(box, 8)),
    ...plateField(corner, [box.x, box.y]),
    ...(named ? [text('corner-name', nameAt, corner.name, { halo: 'sand', reader })] : []),
  ])
}
