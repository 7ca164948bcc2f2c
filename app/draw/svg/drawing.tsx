import { type ElementType, memo, useId } from 'react'
import type { DisplayList, GroupShape, Shape, TextShape } from '~/draw/display-list'
import { GlyphMarks } from '~/draw/svg/glyph'
import './drawing.css'
import './drawing-things.css'
import './drawing-marks.css'

interface DrawingProps {
  list: DisplayList
  /** What the picture is, for screen readers. */
  label: string
  /** What it says, in a sentence or two, for those who cannot see it. */
  description?: string | undefined
  /** The element of a link, `a` where none is given. It gets `href`, `aria-label` and children. */
  link?: ElementType
  className?: string | undefined
  /** Fill the width at the list's proportions (default), or stay at the list's own size. */
  fluid?: boolean
}

/** A display list as SVG. Colours and lines come from the tokens by class; numbers are the list's own. */
export const Drawing = memo(function Drawing(props: DrawingProps) {
  const { list, label, description, link = 'a', className, fluid = true } = props
  const descriptionId = useId()
  const linked = list.shapes.some((shape) => shape.type === 'group' && shape.href !== undefined)
  const size = fluid ? { width: '100%' } : { width: list.width, height: list.height }
  return (
    <svg
      className={className === undefined ? 'drawing' : `drawing ${className}`}
      viewBox={`0 0 ${list.width} ${list.height}`}
      {...size}
      role={linked ? 'group' : 'img'}
      aria-label={label}
      aria-describedby={description === undefined ? undefined : descriptionId}
    >
      {description === undefined ? null : <desc id={descriptionId}>{description}</desc>}
      <Shapes shapes={list.shapes} link={link} />
    </svg>
  )
})

/** The bare shapes, for an `<svg>` of one's own. */
export function Shapes({ shapes, link = 'a' }: { shapes: readonly Shape[]; link?: ElementType }) {
  return shapes.map((shape, i) => drawShape(shape, i, link))
}

function drawShape(shape: Shape, key: number, link: ElementType) {
  switch (shape.type) {
    case 'path':
      return <path key={key} className={`d-${shape.style}`} d={shape.d} strokeWidth={shape.width} />
    case 'polyline':
      return (
        <polyline key={key} className={`d-${shape.style}`} points={shape.points.join(' ')} strokeWidth={shape.width} />
      )
    case 'polygon':
      return <polygon key={key} className={`d-${shape.style}`} points={shape.points.join(' ')} />
    case 'circle':
      return <circle key={key} className={`d-${shape.style}`} cx={shape.x} cy={shape.y} r={shape.r} />
    case 'rect':
      return (
        <rect
          key={key}
          className={`d-${shape.style}`}
          x={shape.x}
          y={shape.y}
          width={shape.width}
          height={shape.height}
          rx={shape.r}
        />
      )
    case 'text':
      return drawText(shape, key)
    case 'glyph':
      return <GlyphMarks key={key} {...shape} />
    case 'group':
      return drawGroup(shape, key, link)
  }
}

function drawText(shape: TextShape, key: number) {
  const halo = shape.halo === undefined ? '' : ` halo-${shape.halo}`
  const anchor = shape.anchor === 'start' ? undefined : shape.anchor
  return (
    <text
      key={key}
      className={`t-${shape.style}${halo}`}
      x={shape.x}
      y={shape.y}
      fontSize={shape.size}
      textAnchor={anchor}
    >
      {shape.words}
    </text>
  )
}

function drawGroup(shape: GroupShape, key: number, Link: ElementType) {
  const children = <Shapes shapes={shape.shapes} link={Link} />
  if (shape.href === undefined) {
    return (
      <g key={key} data-id={shape.id} role={shape.label === undefined ? undefined : 'img'} aria-label={shape.label}>
        {children}
      </g>
    )
  }
  const to = Link === 'a' ? { href: shape.href } : { to: shape.href }
  return (
    <Link key={key} {...to} data-id={shape.id} aria-label={shape.label}>
      {children}
    </Link>
  )
}
