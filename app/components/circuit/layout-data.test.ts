import { describe, expect, test } from 'vitest'
import { degrees, metres, station } from '~/track/units'
import { cornerFields, type LayoutCorner, typedAgain } from './layout-data'

const corner = (id: string, number: string, name: string): LayoutCorner => ({
  id,
  number,
  name,
  direction: 'left',
  turnDegrees: degrees(62),
  leastRadius: metres(41),
  entry: station(110),
  apex: station(140),
})
const now = [corner('a', '1', 'Saltmarsh'), corner('b', '2', 'Groin'), corner('c', '3', 'Lookout')]
const sent = [
  { id: 'a', number: '1', name: 'Saltmarsh', seenNumber: '1', seenName: 'Saltmarsh' },
  { id: 'b', number: '2', name: 'Groyne', seenNumber: '2', seenName: 'Turn 2' },
  { id: 'c', number: '3A', name: 'Turn 3', seenNumber: '3', seenName: 'Turn 3' },
]

describe('a form of corners to be sent again', () => {
  test('a row that nobody typed in is as it is now', () => {
    const [a] = typedAgain([{ ...sent[0], name: 'Marsh', seenName: 'Marsh' }], now, null)
    expect(a).toEqual(cornerFields(now)[0])
  })
  test('a row that was typed in keeps what was typed and what it was typed over', () => {
    expect(typedAgain(sent, now, null)[1]).toMatchObject({ name: 'Groyne', seenName: 'Turn 2', seenNumber: '2' })
  })
  test('of a row typed in, a field left alone is as it is now', () => {
    expect(typedAgain(sent, now, 'c')[2]).toEqual({
      id: 'c',
      number: '3A',
      name: 'Lookout',
      seenNumber: '3',
      seenName: 'Lookout',
    })
  })
  test('once both versions were shown, what the other made counts as seen', () => {
    expect(typedAgain(sent, now, 'b')[1]).toMatchObject({ name: 'Groyne', seenName: 'Groin' })
  })
  test('a form that came without rows begins anew', () => {
    expect(typedAgain('broken', now, null)).toEqual(cornerFields(now))
  })
})
