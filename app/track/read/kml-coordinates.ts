import { tooManyPositions } from '~/track/read/notes'
import { coordinateFits, coordinateProblem, decimal, numberProblem } from '~/track/read/numbers'
import { mostPositions, type Points } from '~/track/read/points'
import { type Problem, problem, quoted } from '~/track/read/problems'

export interface Tuples {
  readonly problem?: Problem
  /** Whether blanks stood next to commas, as in "-14.01, 55.002". */
  readonly blanks: boolean
  /** Tuples with a fourth value. */
  readonly extra: number
}

const isBlank = (c: number) => c === 32 || c === 10 || c === 13 || c === 9

/**
 * Reads the text of a KML `coordinates` element into `points`: tuples "lon,lat" or "lon,lat,height" between white space.
 * Blanks next to a comma belong to the tuple.
 * @param where the place of the element, named in a problem beside the tuple's number
 */
export function readTuples(text: string, points: Points, where: string): Tuples {
  let at = 0
  let tuples = 0
  let blanks = false
  let extra = 0
  const space = () => {
    const start = at
    while (isBlank(text.charCodeAt(at))) at++
    return at > start
  }
  const field = () => {
    const start = at
    for (let c = text.charCodeAt(at); at < text.length && c !== 44 && !isBlank(c); c = text.charCodeAt(at)) at++
    return text.slice(start, at)
  }
  for (space(); at < text.length; space()) {
    const fields = [field()]
    let spaced = false
    tuples++
    for (;;) {
      const before = at
      const blankBefore = space()
      if (text.charCodeAt(at) !== 44) {
        at = before
        break
      }
      at++
      if (space() || blankBefore) spaced = true
      if (fields.length > 4) break
      fields.push(field())
    }
    blanks ||= spaced
    const place = () => `${where}, position ${tuples}`
    const found = take(fields, spaced, points, place)
    if (found) return { problem: found, blanks, extra }
    if (fields.length === 4) extra++
    if (points.length > mostPositions) return { problem: tooManyPositions(place()), blanks, extra }
  }
  return { blanks, extra }
}

function take(fields: readonly string[], spaced: boolean, points: Points, place: () => string): Problem | undefined {
  if (fields.length < 2 || fields.length > 4 || (fields.length === 4 && spaced)) {
    return brokenTuple(fields, place())
  }
  const [lon, lat] = [decimal(fields[0]!), decimal(fields[1]!)]
  if (Number.isNaN(lon)) return numberProblem(fields[0]!, 'longitude', place())
  if (Number.isNaN(lat)) return numberProblem(fields[1]!, 'latitude', place())
  if (!coordinateFits(lon, lat) && fields.length === 4) return brokenTuple(fields, place())
  if (!coordinateFits(lon, lat)) return coordinateProblem(lon, lat, place())
  const height = decimal(fields[2] ?? '')
  if (Number.isNaN(height) && fields[2] !== undefined && fields[2] !== '')
    return numberProblem(fields[2], 'height', place())
  points.push(lon, lat, height)
  return undefined
}

function brokenTuple(fields: readonly string[], place: string): Problem {
  const says = `${quoted(fields.join(','))} is not a position. Write longitude,latitude or longitude,latitude,height, with points in the numbers.`
  return problem('coordinates-broken', says, place)
}
