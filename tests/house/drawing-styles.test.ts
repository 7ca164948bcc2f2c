import { readdirSync, readFileSync } from 'node:fs'
import { join } from 'node:path'
import { describe, expect, it } from 'vitest'
import { HALO_KEYS, STYLE_KEYS } from '~/draw/style-keys'
import { TEXT_FACES, type TextStyle } from '~/draw/text-styles'

const folder = 'app/draw/svg'
const css = readdirSync(folder)
  .filter((name) => name.endsWith('.css'))
  .map((name) => readFileSync(join(folder, name), 'utf8'))
  .join('\n')

/** Families whose members share one rule. */
const FAMILIES = /^(d-tether|d-water-line|t-name)-/

const ruled = (name: string) => new RegExp(`\\.${name}(?![\\w-])`).test(css)

/** The declarations of a word style: its own rule, or its family's. */
function facesOf(style: TextStyle): string {
  const selector = style.startsWith('name-') ? '\\[class\\^="t-name-"\\]' : `\\.t-${style}`
  return [...css.matchAll(new RegExp(`\\.drawing ${selector} \\{([^}]*)\\}`, 'g'))].map(([, rule]) => rule).join('')
}

describe('the styles of drawings', () => {
  it('have a rule for every key, every word style with a look of its own and every halo', () => {
    const names = [...STYLE_KEYS.map((key) => `d-${key}`), ...HALO_KEYS.map((key) => `halo-${key}`)].filter(
      (name) => !FAMILIES.test(name),
    )
    expect(names.filter((name) => !ruled(name))).toEqual([])
    expect(css).toContain('[class^="d-tether-"]')
    expect(css).toContain('[class^="d-water-line-"]')
  })

  it('set words in the faces that their widths are reckoned with', () => {
    const wrong = (Object.keys(TEXT_FACES) as TextStyle[]).filter((style) => {
      const rule = facesOf(style)
      const weight = Number(rule.match(/font-weight: (\d+)/)?.[1] ?? 430)
      const stretch = Number(rule.match(/font-stretch: (\d+)%/)?.[1] ?? 82)
      return weight !== TEXT_FACES[style].weight || stretch !== TEXT_FACES[style].stretch
    })
    expect(wrong).toEqual([])
  })

  it('take every colour from the tokens, so that the night carries over', () => {
    const values = [...css.matchAll(/(?:fill|stroke|color): ([^;]+);/g)].map(([, value]) => value!)
    expect(values.length).toBeGreaterThan(80)
    expect(values.filter((value) => !/var\(--|currentColor|none|transparent/.test(value))).toEqual([])
  })
})
