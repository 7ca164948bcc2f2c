import { describe, expect, it } from 'vitest'
import { sheetWidth } from './sheet-width.server'

const from = (headers: Record<string, string>) => sheetWidth(new Request('http://localhost/', { headers }))
const phoneAgent = 'Mozilla/5.0 (Linux; Android 14) Chrome/150.0.0.0 Mobile Safari/537.36'

describe('the width a drawing is guessed to have', () => {
  it('is a phone’s where the browser says so, a desk’s otherwise', () => {
    expect(from({ 'user-agent': phoneAgent })).toBe(342)
    expect(from({ 'user-agent': 'Mozilla/5.0 (X11; Linux x86_64)' })).toBe(955)
    expect(from({})).toBe(955)
  })

  it('goes by the client hint before the user agent', () => {
    expect(from({ 'sec-ch-ua-mobile': '?0', 'user-agent': phoneAgent })).toBe(955)
    expect(from({ 'sec-ch-ua-mobile': '?1' })).toBe(342)
  })
})
