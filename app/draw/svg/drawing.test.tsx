import { renderToStaticMarkup } from 'react-dom/server'
import { describe, expect, it } from 'vitest'
import { circle, type DisplayList, path, polyline, rect, text } from '~/draw/display-list'
import { GLYPH_FORMS, GLYPH_KINDS } from '~/draw/glyphs'
import { Drawing } from '~/draw/svg/drawing'
import { MarkGlyph } from '~/draw/svg/glyph'

const list: DisplayList = {
  width: 320,
  height: 90,
  shapes: [
    rect('paper', { x: 0, y: 0, width: 320, height: 90 }),
    polyline(
      'road',
      [
        [3.0777, 20],
        [300.06, 41.25],
      ],
      8.49,
    ),
    path('coast', 'M0 80L320 77', 1.1),
    {
      type: 'group',
      id: 'five',
      href: '/corners/5',
      label: '5 Slipway',
      shapes: [circle('needle-ring', [70, 50], 12.34), text('corner-name', [90, 55], 'Slipway', { halo: 'sand' })],
    },
    {
      type: 'glyph',
      style: 'mk-gear',
      kind: 'gear',
      form: 'driven',
      x: 200.3,
      y: 44,
      size: 15,
      turn: 31.5,
      mirror: false,
      gear: 4,
    },
  ],
}
const markup = () => renderToStaticMarkup(<Drawing list={list} label="A piece of road" description="It bends." />)

describe('a drawing on the screen', () => {
  it('is the same markup every time', () => {
    expect(markup()).toBe(markup())
  })

  it('has its numbers as the list has them', () => {
    expect(markup()).toContain('points="3.1 20 300.1 41.3"')
    expect(markup()).toContain('stroke-width="8.5"')
    expect(markup()).toContain('translate(200.3 44) scale(0.625)')
  })

  it('is a group with a name where something in it is a link, else a picture', () => {
    expect(markup()).toContain('role="group" aria-label="A piece of road"')
    expect(markup()).toContain('<a href="/corners/5" data-id="five" aria-label="5 Slipway">')
    const still = renderToStaticMarkup(<Drawing list={{ ...list, shapes: list.shapes.slice(0, 3) }} label="Bare" />)
    expect(still).toContain('role="img" aria-label="Bare"')
  })

  it('never turns the bar of a driven mark, nor a gear', () => {
    const turned = renderToStaticMarkup(<MarkGlyph kind="brake" form="driven" size={19} turn={90} />)
    expect(turned).toMatch(/rotate\(90\)/)
    expect(turned).toMatch(/<\/g><rect class="g-bar"/)
    expect(markup()).not.toContain('rotate(31.5)')
  })

  it('keeps room for every form of every kind', () => {
    for (const kind of GLYPH_KINDS) {
      for (const form of GLYPH_FORMS) {
        const glyph = renderToStaticMarkup(<MarkGlyph kind={kind} form={form} size={13} gear={2} />)
        const [, width, height] = glyph.match(/width="([\d.]+)" height="([\d.]+)"/)!.map(Number)
        expect(width).toBeGreaterThanOrEqual(13)
        expect(height! > width!).toBe(form === 'driven')
      }
    }
  })
})
