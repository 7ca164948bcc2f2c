import type { Ground } from '~/book/kinds'
import { GLYPH_BOX, glyphKind } from '~/draw/glyphs'
import { glyphSize, type PlacedMark } from '~/draw/map-marks'
import type { Road } from '~/draw/road'
import { GlyphMarks } from '~/draw/svg/glyph'
import type { LngLat } from '~/track/units'
import { Handle } from './handle'

/** A nudge in metres: along the road (further on positive) and across it (left positive). */
export interface Nudge {
  along: number
  across: number
}

export interface MarkHandlers {
  onSelect: (mark: string) => void
  onMove: (mark: string, ground: Ground, to: LngLat) => void
  onNudge: (mark: string, ground: Ground, by: Nudge) => void
}

interface MarkHandlesProps extends MarkHandlers {
  placed: readonly PlacedMark[]
  road: Road
  selected: string | null
  mirror: boolean
  movable: (mark: string, ground: Ground) => boolean
  onDrag: (mark: string, ground: Ground, to: LngLat) => void
}

const LAYERS = { sim: 100, real: 200, selected: 1000 } as const

/** A glyph's middle is the handle's, whatever its form adds below. */
const VIEW_BOX = `${-GLYPH_BOX / 2} ${-GLYPH_BOX / 2} ${GLYPH_BOX} ${GLYPH_BOX}`

/** The marks of a map as handles: simulator under real, the selected one on top. */
export function MarkHandles({ placed, road, selected, mirror, movable, ...on }: MarkHandlesProps) {
  return placed.map(({ mark, ground, place, turn }) => {
    const isSelected = mark.id === selected
    return (
      <Handle
        key={`${mark.id} ${ground}`}
        at={road.frame.pointAt(place.station, place.offset)}
        label={place.label}
        selected={isSelected}
        movable={movable(mark.id, ground)}
        layer={LAYERS[ground] + (isSelected ? LAYERS.selected : 0)}
        className="map-mark"
        onSelect={() => on.onSelect(mark.id)}
        onDrag={(to) => on.onDrag(mark.id, ground, to)}
        onDrop={(to) => on.onMove(mark.id, ground, to)}
        onNudge={({ forward, left }) => on.onNudge(mark.id, ground, { along: forward, across: left })}
      >
        <svg
          className="drawing glyph"
          width={glyphSize(ground)}
          height={glyphSize(ground)}
          viewBox={VIEW_BOX}
          aria-hidden="true"
        >
          <GlyphMarks
            {...{ turn, mirror }}
            style={`mk-${mark.kind}`}
            kind={glyphKind(mark.kind, mark.role)}
            form={place.form}
            x={0}
            y={0}
            size={GLYPH_BOX}
            gear={mark.gear}
          />
        </svg>
      </Handle>
    )
  })
}
