import Flatbush from 'flatbush'
import { type Flat, flatten, gapBetween, lengthAlong } from '~/track/read/on-plane'
import { type Content, type Line, Points } from '~/track/read/points'
import { inMetres, type Problem, problem, several } from '~/track/read/problems'
import { type Metres, metres } from '~/track/units'

/** Most pieces named in a warning. */
const mostNamed = 10
/** Widest gap bridged between two pieces, in metres. */
const widestGap = 60
/** Ends this near count as one place, where the straightest way on is taken. */
const samePlace = 1
/** Two pieces drawn from the same position share it; nothing is added there. */
const sharedPosition = 0.01
/** No shorter ring is looked for. */
const shortestRing = 300
/** Metres of a piece that tell which way it leaves its end. */
const headingMetres = 10

/** One piece of a drawing, as offered. */
export interface Piece {
  /** Number of the piece in the file, from 1: what `options.pieces` takes. */
  readonly index: number
  readonly lengthMetres: Metres
  readonly name?: string
  /** Whether the line that was read goes over it. */
  readonly used: boolean
}

/** A line of its own, joined from a file's pieces. */
export interface Joined {
  readonly points: Points
  readonly name?: string
  readonly pieces?: readonly Piece[]
  readonly warnings: readonly Problem[]
}

/** A piece laid into the chain, front to back or the other way. */
interface Link {
  readonly piece: number
  readonly backwards: boolean
}

/** The places that a link goes in by and comes out by. */
const entry = (lines: readonly Line[], { piece, backwards }: Link) =>
  backwards ? lines[piece]!.end - 1 : lines[piece]!.start
const exit = (lines: readonly Line[], { piece, backwards }: Link) =>
  backwards ? lines[piece]!.start : lines[piece]!.end - 1

/**
 * Joins the pieces of a drawing end to end: from the longest piece on, always to the nearest free end within 60 m (of
 * those within a metre of the nearest the one straightest ahead), until the ring closes; where the chain ends, it goes on
 * from its other end. The line runs the way that most of its length is drawn. Pieces left over are listed.
 * @param wanted numbers of the pieces to join, from 1; all of them where none are given
 */
export function joinPieces(content: Content, wanted?: readonly number[]): Joined | Problem {
  const { points, lines } = content
  const stranger = wanted?.find((index) => !lines[index - 1])
  if (stranger !== undefined || wanted?.length === 0) {
    const says = `There is no piece ${stranger ?? 'chosen'}: the drawing has ${several(lines.length, 'piece')}. Choose among them.`
    return problem('no-such-piece', says, undefined, 'choose-pieces')
  }
  const flat = flatten(points)
  const lengths = lines.map(({ start, end }) => lengthAlong(flat, start, end))
  const free = new Set(wanted ? wanted.map((index) => index - 1) : lines.keys())
  const chain = chainOf(flat, lines, lengths, free)
  const used = new Set(chain.map(({ piece }) => piece))
  const named = chain.map(({ piece }) => lines[piece]!).find(({ name }) => name)
  return {
    points: copyChain(points, flat, lines, chain),
    ...((named?.name ?? content.name) && { name: (named?.name ?? content.name)! }),
    ...(lines.length > 1 && {
      pieces: lines.map(({ name }, i) => ({
        index: i + 1,
        lengthMetres: metres(lengths[i]!),
        ...(name && { name }),
        used: used.has(i),
      })),
    }),
    warnings: warningsOf(flat, lines, lengths, chain, used),
  }
}

function chainOf(flat: Flat, lines: readonly Line[], lengths: readonly number[], free: Set<number>): Link[] {
  let longest = -1
  for (const piece of free) if (longest === -1 || lengths[piece]! > lengths[longest]!) longest = piece
  free.delete(longest)
  const ends = endsOf(flat, lines)
  let chain: Link[] = [{ piece: longest, backwards: false }]
  let length = lengths[longest]!
  for (let turned = false; ; ) {
    const head = entry(lines, chain[0]!)
    const tail = exit(lines, chain.at(-1)!)
    const next = nearest(flat, lines, ends, free, chain.at(-1)!)
    const home = length >= shortestRing ? gapBetween(flat, tail, head) : Number.POSITIVE_INFINITY
    const away = next ? gapBetween(flat, tail, entry(lines, next)) : Number.POSITIVE_INFINITY
    if (home <= widestGap && home <= away + samePlace) break
    if (next && away <= widestGap) {
      chain.push(next)
      free.delete(next.piece)
      length += lengths[next.piece]! + away
    } else if (turned) break
    else {
      turned = true
      chain = turnedRound(chain)
    }
  }
  const against = chain.reduce((sum, { piece, backwards }) => sum + (backwards ? 1 : -1) * lengths[piece]!, 0)
  return against > 0 ? turnedRound(chain) : chain
}

const turnedRound = (chain: readonly Link[]): Link[] =>
  chain.toReversed().map(({ piece, backwards }) => ({ piece, backwards: !backwards }))

/** The free piece end nearest to where a link comes out; of those as near as that the one straightest ahead. */
function nearest(flat: Flat, lines: readonly Line[], ends: Flatbush, free: ReadonlySet<number>, from: Link) {
  const tail = exit(lines, from)
  const [x, y] = [flat.x[tail]!, flat.y[tail]!]
  const isFree = (end: number) => free.has(end >> 1)
  const links = ends
    .search(x - widestGap, y - widestGap, x + widestGap, y + widestGap, isFree)
    .map((end) => ({ piece: end >> 1, backwards: end % 2 === 1 }))
  let least = widestGap
  for (const link of links) least = Math.min(least, gapBetween(flat, tail, entry(lines, link)))
  const [backX, backY] = heading(flat, lines, { piece: from.piece, backwards: !from.backwards })
  let best: Link | undefined
  let straightest = Number.NEGATIVE_INFINITY
  for (const link of links) {
    if (gapBetween(flat, tail, entry(lines, link)) > least + samePlace) continue
    const [onX, onY] = heading(flat, lines, link)
    const straight = -(onX * backX + onY * backY)
    if (straight <= straightest) continue
    straightest = straight
    best = link
  }
  return best
}

/** Index of the pieces' ends: the front of piece k is item 2k, its back item 2k + 1. */
function endsOf({ x, y }: Flat, lines: readonly Line[]): Flatbush {
  const ends = new Flatbush(2 * lines.length)
  for (const { start, end } of lines) for (const i of [start, end - 1]) ends.add(x[i]!, y[i]!)
  ends.finish()
  return ends
}

/** Unit vector from where a link goes in towards its inside. */
function heading(flat: Flat, lines: readonly Line[], link: Link): [number, number] {
  const step = link.backwards ? -1 : 1
  const from = entry(lines, link)
  const last = exit(lines, link)
  let to = from
  while (to !== last && gapBetween(flat, from, to) < headingMetres) to += step
  const length = gapBetween(flat, from, to) || 1
  return [(flat.x[to]! - flat.x[from]!) / length, (flat.y[to]! - flat.y[from]!) / length]
}

function copyChain(points: Points, flat: Flat, lines: readonly Line[], chain: readonly Link[]): Points {
  const joined = new Points(points.length, points.hasWidths)
  let before = -1
  for (const link of chain) {
    const step = link.backwards ? -1 : 1
    const last = exit(lines, link)
    for (let i = entry(lines, link); ; i += step) {
      const shared = i === entry(lines, link) && before !== -1 && gapBetween(flat, before, i) < sharedPosition
      if (!shared) joined.copy(points, i)
      if (i === last) break
    }
    before = last
  }
  return joined
}

function warningsOf(
  flat: Flat,
  lines: readonly Line[],
  lengths: readonly number[],
  chain: readonly Link[],
  used: ReadonlySet<number>,
): Problem[] {
  const warnings: Problem[] = []
  if (chain.length > 1) {
    const gaps = chain.slice(1).map((link, i) => gapBetween(flat, exit(lines, chain[i]!), entry(lines, link)))
    const widest = Math.max(...gaps)
    const bridged =
      widest > samePlace ? ` The widest gap between two of them, ${inMetres(widest)}, is drawn straight.` : ''
    const says = `The line is joined from ${several(chain.length, 'piece')}.${bridged} Check that it runs the right way round.`
    warnings.push(problem('pieces-joined', says))
  }
  const over = lines.map((_, i) => i).filter((i) => !used.has(i))
  if (over.length > 0) {
    const list = over.slice(0, mostNamed).map((i) => {
      const name = lines[i]!.name ? ` “${lines[i]!.name}”` : ''
      return `piece ${i + 1}${name} (${inMetres(lengths[i]!)})`
    })
    const more = over.length > mostNamed ? ` and ${over.length - mostNamed} more` : ''
    const says = `${several(over.length, 'piece is', 'pieces are')} left out: ${list.join(', ')}${more}. Choose other pieces where one of them belongs to the lap.`
    warnings.push(problem('pieces-left-out', says, undefined, 'choose-pieces'))
  }
  return warnings
}
