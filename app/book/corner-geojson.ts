import type { Feature, FeatureCollection } from 'geojson'
import { cornerFeature, featureCollection, lineFeature, pointFeature } from '~/track/geojson'
import { wrap } from '~/track/lap-frame'
import type { LayoutFrame } from '~/track/layout-frame'
import { station } from '~/track/units'
import type { CornerCut } from './cuts'
import { GROUNDS, type Ground } from './kinds'
import type { LandmarkView, MarkView, PlacementView } from './view'

/**
 * A corner for other programs (RFC 7946): its stretch of road as a LineString, then landmarks and marks, one feature for each
 * ground they have a place on. Metres in properties are along the road; `offset` is left positive.
 */
export function cornerGeoJson(cut: CornerCut, frame: LayoutFrame): FeatureCollection {
  const { corner } = cut
  return featureCollection([
    cornerFeature(
      frame,
      { from: corner.from, until: corner.exit },
      {
        type: 'corner',
        number: corner.number,
        name: corner.name,
        direction: corner.direction,
        turnDegrees: corner.turnDegrees,
        leastRadius: corner.leastRadius,
        datumStation: corner.datum.station,
        datum: corner.datum.words,
      },
      corner.id,
    ),
    ...cut.landmarks.flatMap((landmark) => GROUNDS.flatMap((ground) => landmarkFeature(landmark, ground, frame) ?? [])),
    ...corner.marks.flatMap((mark) => GROUNDS.flatMap((ground) => markFeature(mark, ground, frame) ?? [])),
  ])
}

const featureId = (id: string, ground: Ground) => `${id}/${ground}`

function landmarkFeature(landmark: LandmarkView, ground: Ground, frame: LayoutFrame): Feature | null {
  const placement = landmark[ground]
  if (!placement) return null
  const properties = {
    type: 'landmark',
    landmark: landmark.id,
    ground,
    kind: landmark.kind,
    name: landmark.name,
    text: landmark.text,
    height: landmark.height,
    station: placement.station,
    until: placement.until,
    offset: placement.offset,
  }
  const id = featureId(landmark.id, ground)
  const line = edgePositions(placement, frame)
  return line
    ? lineFeature(line, properties, id)
    : pointFeature(frame.pointAt(placement.station, placement.offset ?? 0), properties, id)
}

/** Points every 5 m along a thing with length; null for one without. */
function edgePositions(placement: PlacementView, frame: LayoutFrame) {
  if (placement.until === null || placement.until === placement.station) return null
  const length = frame.ahead(placement.station, placement.until)
  const count = Math.max(1, Math.ceil(length / 5))
  return Array.from({ length: count + 1 }, (_, index) => {
    const at = station(wrap(placement.station + (length * index) / count, frame.length))
    return frame.pointAt(at, placement.offset ?? 0)
  })
}

function markFeature(mark: MarkView, ground: Ground, frame: LayoutFrame): Feature | null {
  const place = mark[ground]
  if (!place) return null
  return pointFeature(
    frame.pointAt(place.station, place.offset),
    {
      type: 'mark',
      mark: mark.id,
      ground,
      kind: mark.kind,
      role: mark.role,
      manner: mark.manner,
      condition: mark.condition,
      forPerson: mark.forPerson,
      gear: mark.gear,
      speed: mark.speed,
      station: place.station,
      offset: place.offset,
      toDatum: place.toDatum,
      tiedTo: place.stored.tie?.words ?? null,
    },
    featureId(mark.id, ground),
  )
}
