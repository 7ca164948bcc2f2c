import file from './marram-head.json'

/** The demo circuit as it was invented: local metres, x east, y north, z up, from an anchor in open sea. */

export type LocalPoint = [x: number, y: number]

/** Places along the road in metres from the start line; `offset` positive to the left of travel. */
export interface SourceSpan {
  station?: number
  fromStation?: number
  untilStation?: number
  x?: number
  y?: number
  edgeLength?: number
}

export interface SourceLandmark {
  kind: string
  name: string
  corner?: string
  side?: 'left' | 'right'
  offset?: number
  offsetFrom?: number
  offsetTo?: number
  height?: number
  text?: string
  width?: number
  blockLength?: number
  edgeLength?: number
  existsIn?: 'real' | 'sim'
  real?: SourceSpan
  sim?: SourceSpan
}

export interface SourceMark {
  kind: 'look' | 'brake' | 'lift' | 'gear' | 'turnin' | 'release' | 'apex' | 'throttle' | 'full' | 'trackout'
  role?: 'start' | 'target'
  manner?: 'brush' | 'full' | 'trail' | 'squeeze'
  condition: 'dry' | 'wet'
  /** Metres along the road to the corner's datum, negative before it. */
  toDatum: number
  offset: number
  gear: number
  downshifts?: number
  speedKmh: number
  tie: { words: string; across: string; landmark?: string }
  proof: SourceProof[]
  sim?: { toDatum: number; offset: number }
  compromisedFor?: string
}

export interface SourceProof {
  driver: string
  condition: 'dry' | 'wet'
  state: 'told' | 'foot' | 'driven'
  by: string
  on: string
}

export interface SourceCorner {
  number: string
  name: string
  direction: 'left' | 'right'
  turnDegrees: number
  flatOut: boolean
  datum: { station: number; words: string }
  roadBends: { fromStation: number; untilStation: number; filletRadius: number }
  gearIn: number
  gearOut: number
  speedInKmh: number
  leastSpeedKmh: number
  linkedTo?: string
  card?: {
    line: string
    kerbs: { part: string; words: string }[]
    surface: string
    water: string
    car: string
    mistake: string
    traffic: string
    limits: string
    backup: string
    sets: string
  }
  marks: SourceMark[]
}

interface Source {
  name: string
  anchor: { lon: number; lat: number }
  timeZone: string
  /** Lap length in metres. */
  length: number
  roadWidth: number
  car: { name: string; length: number; width: number; eyeHeight: number }
  dates: { drivenTest: string; trackWalk: string; race: string }
  /** Every 2 m: station, x, y, z. */
  centreline: { rows: [station: number, x: number, y: number, z: number][] }
  corners: SourceCorner[]
  landmarks: SourceLandmark[]
  ground: {
    coast: LocalPoint[]
    inlet: LocalPoint[]
    mast: LocalPoint
    marsh: LocalPoint[]
    groynes: LocalPoint[][]
    breakwater: LocalPoint[]
    gravel: { corner: string; ring: LocalPoint[] }[]
    contours: { height: number; rings: LocalPoint[][] }[]
    pitLane: LocalPoint[]
    paddock: LocalPoint[]
    pitBuilding: LocalPoint[]
    grandstand: LocalPoint[]
    lane: LocalPoint[]
    buildings: LocalPoint[][]
  }
}

export const source = file as unknown as Source
