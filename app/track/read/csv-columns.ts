/** Which columns of a CSV hold what, by their index. */
export interface Columns {
  /** Longitude, or x in metres where `metric`. */
  readonly first: number
  /** Latitude, or y in metres where `metric`. */
  readonly second: number
  readonly metric: boolean
  readonly height?: number
  readonly time?: { readonly column: number /** Seconds in one of its units. */; readonly seconds: number }
  /** Road width to the right and to the left of the line. */
  readonly right?: number
  readonly left?: number
}

const names = {
  lon: ['lon', 'lng', 'long', 'longitude'],
  lat: ['lat', 'latitude'],
  height: ['height', 'ele', 'elev', 'elevation', 'alt', 'altitude', 'z'],
  time: ['time', 'timestamp', 'datetime', 't'],
  x: ['x'],
  y: ['y'],
  right: ['right'],
  left: ['left'],
} as const

/** Words that make a column another quantity: "lat accel", "height error". */
const otherQuantities = [
  'acc',
  'accel',
  'acceleration',
  'accuracy',
  'g',
  'force',
  'error',
  'err',
  'sigma',
  'std',
  'speed',
  'velocity',
  'count',
]

/** "GPS Longitude (deg)" → gps, longitude, deg; "posLat" → pos, lat. */
const wordsOf = (field: string) =>
  field
    .slice(0, 80)
    .replace(/([a-z])([A-Z])/g, '$1 $2')
    .toLowerCase()
    .split(/[^a-z]+/)
    .filter((word) => word !== '')

/** The columns that a row of names gives, or nothing where it names neither longitude and latitude nor x and y. */
export function columnsOf(fields: readonly string[]): Columns | undefined {
  const words = fields.map(wordsOf)
  const find = (wanted: readonly string[]) => {
    const exact = words.findIndex((some) => some.length === 1 && wanted.includes(some[0]!))
    if (exact !== -1) return exact
    return words.findIndex(
      (some) => some.some((word) => wanted.includes(word)) && !some.some((word) => otherQuantities.includes(word)),
    )
  }
  const [lon, lat, x, y] = [find(names.lon), find(names.lat), find(names.x), find(names.y)]
  const metric = lon === -1 || lat === -1
  const [first, second] = metric ? [x, y] : [lon, lat]
  if (first === -1 || second === -1 || first === second) return undefined
  const [height, time, right, left] = [find(names.height), find(names.time), find(names.right), find(names.left)]
  const bothSides = right !== -1 && left !== -1
  return {
    first,
    second,
    metric,
    ...(height !== -1 && { height }),
    ...(time !== -1 && { time: { column: time, seconds: words[time]!.includes('ms') ? 0.001 : 1 } }),
    ...(bothSides && { right, left }),
  }
}
