import {
  DRIVEN_BAR,
  GEAR_DIGIT,
  GLYPH_BOX,
  type GlyphForm,
  type GlyphKind,
  glyphParts,
  STATE_ICONS,
  type StateIcon,
} from '~/draw/glyphs'
import type { StyleKey } from '~/draw/style-keys'
import './drawing.css'
import './drawing-things.css'
import './drawing-marks.css'

interface GlyphMarksProps {
  kind: GlyphKind
  form: GlyphForm
  style: StyleKey
  x: number
  y: number
  size: number
  turn: number
  mirror: boolean
  gear: number | null
}

const round = (value: number, digits: number) => Math.round(value * 10 ** digits) / 10 ** digits + 0

/** A glyph's elements inside an SVG, its middle at x, y. */
export function GlyphMarks({ kind, form, style, x, y, size, turn, mirror, gear }: GlyphMarksProps) {
  const parts = glyphParts(kind, form)
  const scale = round(size / GLYPH_BOX, 4)
  const middle = GLYPH_BOX / 2
  const turned = parts.turns && turn !== 0 ? ` rotate(${turn})` : ''
  const scaled = kind === 'turnin' && mirror ? `scale(${-scale} ${scale})` : `scale(${scale})`
  return (
    <g className={`d-${style}`}>
      <g transform={`translate(${x} ${y})${turned} ${scaled} translate(${-middle} ${-middle})`}>
        {parts.filled ? (
          <path className="g-solid" d={parts.outline} />
        ) : (
          <>
            <path className="g-halo" d={parts.outline} />
            <path
              className={parts.dashed ? 'g-line g-dashed' : 'g-line'}
              d={parts.outline}
              strokeWidth={parts.lineWidth}
            />
          </>
        )}
        {parts.point === null ? null : (
          <circle className={parts.point.hole ? 'g-hole' : 'g-dot'} cx={middle} cy={middle} r={parts.point.r} />
        )}
        {gear === null || kind !== 'gear' ? null : (
          <text className={parts.filled ? 't-gear-digit g-hole' : 't-gear-digit'} {...GEAR_DIGIT}>
            {gear}
          </text>
        )}
      </g>
      {parts.bar ? (
        <rect
          className="g-bar"
          x={round(x + (DRIVEN_BAR.x - middle) * scale, 1)}
          y={round(y + (DRIVEN_BAR.y - middle) * scale, 1)}
          width={round(DRIVEN_BAR.width * scale, 1)}
          height={round(DRIVEN_BAR.height * scale, 1)}
        />
      ) : null}
    </g>
  )
}

interface MarkGlyphProps {
  kind: GlyphKind
  form: GlyphForm
  /** Side of the 24 box in px; 13 at least. */
  size: number
  gear?: number | null
  /** Degrees clockwise from travel straight up; 0 in tables, 90 on a strip from left to right. */
  turn?: number
  mirror?: boolean
  /** Left out where words beside it say the same. */
  label?: string
}

/** A mark's glyph standing alone: in a table, a button, a list. */
export function MarkGlyph({ kind, form, size, gear = null, turn = 0, mirror = false, label }: MarkGlyphProps) {
  const style: StyleKey = kind === 'brakestart' ? 'mk-brake' : `mk-${kind}`
  const side = round((size * 27) / GLYPH_BOX, 2)
  const bar = form === 'driven' ? round((size * 3) / GLYPH_BOX, 2) : 0
  return (
    <svg
      className="drawing glyph"
      width={side}
      height={side + bar}
      viewBox={`-1.5 -1.5 27 ${form === 'driven' ? 30 : 27}`}
      role={label === undefined ? undefined : 'img'}
      aria-label={label}
      aria-hidden={label === undefined ? true : undefined}
    >
      <GlyphMarks
        kind={kind}
        form={form}
        style={style}
        x={12}
        y={12}
        size={24}
        turn={turn}
        mirror={mirror}
        gear={gear}
      />
    </svg>
  )
}

/** A state's icon; the word beside it says what it is. */
export function StateGlyph({ icon, size = 16 }: { icon: StateIcon; size?: number }) {
  return (
    <svg
      width={size}
      height={size}
      viewBox="0 0 20 20"
      fill="none"
      stroke="currentColor"
      strokeWidth="1.6"
      strokeLinejoin="round"
      strokeLinecap="round"
      aria-hidden="true"
    >
      {STATE_ICONS[icon].map((d) => (
        <path key={d} d={d} />
      ))}
    </svg>
  )
}
