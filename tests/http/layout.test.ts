import { readFileSync } from 'node:fs'
import { beforeAll, describe, expect, test } from 'vitest'
import { signIn, type Visitor, wordsOf } from './visitor'

const TEAM = '/teams/lanternside'
let coach: Visitor
let manager: Visitor
let circuit = ''

/** The fields of a form as the page shows them; of radios, selects and boxes nothing. */
function fieldsOf(html: string): Record<string, string> {
  const value = (tag: string, name: string) => new RegExp(`\\b${name}="([^"]*)"`).exec(tag)?.[1]
  const inputs = [...html.matchAll(/<input[^>]*>/g)].map(([tag]) => tag)
  return Object.fromEntries(
    inputs.flatMap((tag) => {
      const name = value(tag, 'name')
      return name && value(tag, 'type') !== 'checkbox' ? [[name, value(tag, 'value') ?? '']] : []
    }),
  )
}

/** The form of corners with one name typed anew, as this visitor's page shows it now. */
async function renamed(visitor: Visitor, at: number, name: string) {
  const fields = fieldsOf((await visitor.get(circuit)).text)
  const corners = Object.entries(fields).filter(([field]) => field.startsWith('corners['))
  return { ...Object.fromEntries(corners), intent: 'corners', [`corners[${at}].name`]: name }
}

beforeAll(async () => {
  coach = await signIn('coach')
  manager = await signIn('manager')
  const bytes = readFileSync('tests/fixtures/circuits/sandbar.kml')
  const uploaded = await coach.upload(`${TEAM}/circuits/import`, { name: 'sandbar.kml', bytes })
  const draft = String(uploaded.headers.location)
  const keys = [...(await coach.get(draft)).text.matchAll(/name="corners\[\d+\]\.key" value="(\d+)"/g)]
  const rows = keys.flatMap(([, key], i) => [
    [`corners[${i}].key`, key],
    [`corners[${i}].accept`, 'on'],
    [`corners[${i}].number`, String(i + 1)],
  ])
  const saved = await coach.post(draft, {
    intent: 'save',
    name: 'Shoal Ring',
    layout: 'Full circuit',
    timeZone: 'Atlantic/Azores',
    roadWidth: '11',
    ...Object.fromEntries(rows),
  })
  circuit = String(saved.headers.location)
  expect(circuit).toBe(`${TEAM}/circuits/shoal-ring`)
})

describe('corners of a layout', () => {
  test('without a name of their own are called by their number', async () => {
    expect((await coach.get(circuit)).text).toContain('value="Turn 3"')
  })
  test('are renamed, and that can be taken back', async () => {
    const kept = await coach.post(circuit, await renamed(coach, 2, 'Oystercatcher'))
    expect(kept.status).toBe(200)
    expect(wordsOf(kept)).toContain('1 change kept.')
    const operation = /role="status"[\s\S]*?name="operation" value="([0-9a-f-]{36})"/.exec(kept.text)?.[1] ?? ''
    const undone = await coach.post(circuit, { intent: 'undo', operation })
    expect(wordsOf(undone)).toContain('Taken back.')
    expect(undone.text).toContain('value="Turn 3"')
  })
  test('keep what another changed meanwhile where nobody typed', async () => {
    const mine = await renamed(coach, 0, 'Sandspit')
    expect((await manager.post(circuit, await renamed(manager, 1, 'Mussel'))).status).toBe(200)
    expect((await coach.post(circuit, mine)).status).toBe(200)
    const page = await coach.get(circuit)
    expect(page.text).toContain('value="Sandspit"')
    expect(page.text).toContain('value="Mussel"')
  })
  test('that two people rename are shown in both versions, and nothing of the form is written', async () => {
    const mine = { ...(await renamed(coach, 3, 'Whelk')), 'corners[4].name': 'Cockle' }
    expect((await manager.post(circuit, await renamed(manager, 3, 'Limpet'))).status).toBe(200)
    const answer = await coach.post(circuit, mine)
    expect(answer.status).toBe(409)
    expect(wordsOf(answer)).toMatch(/Two people changed corner 4 Limpet\. Keep one\..*theirs Limpet.*yours Whelk/)
    expect((await manager.get(circuit)).text).not.toContain('value="Cockle"')

    const again = fieldsOf(answer.text)
    expect(again['corners[4].name']).toBe('Cockle')
    const theirs = await coach.post(circuit, { ...again, skip: again['corners[3].id'] ?? '' })
    expect(theirs.status).toBe(200)
    const page = (await coach.get(circuit)).text
    expect(page).toContain('value="Limpet"')
    expect(page).toContain('value="Cockle"')
  })
  test('kept in one’s own version, once both were shown, are written', async () => {
    const mine = await renamed(coach, 5, 'Periwinkle')
    expect((await manager.post(circuit, await renamed(manager, 5, 'Barnacle'))).status).toBe(200)
    const answer = await coach.post(circuit, mine)
    expect(answer.status).toBe(409)
    expect((await coach.post(circuit, { ...fieldsOf(answer.text), intent: 'corners' })).status).toBe(200)
    expect((await manager.get(circuit)).text).toContain('value="Periwinkle"')
  })
  test('two of one number are told so, with what was typed', async () => {
    const answer = await coach.post(circuit, { ...(await renamed(coach, 0, 'Sandbank')), 'corners[1].number': '1' })
    expect(answer.status).toBe(400)
    expect(wordsOf(answer)).toContain('1 is there twice.')
    expect(answer.text).toContain('value="Sandbank"')
  })
  test('a driver changes none, and sees no field for it', async () => {
    const driver = await signIn('driver')
    expect((await driver.get(circuit)).text).not.toContain('name="corners[0].name"')
    expect((await driver.post(circuit, await renamed(coach, 0, 'Sandbank'))).status).toBe(403)
  })
})

describe('start line and direction of a layout', () => {
  const way = async (visitor: Visitor) => {
    const { seenStart, seenReversed } = fieldsOf((await visitor.get(circuit)).text)
    return { seenStart: seenStart ?? '', seenReversed: seenReversed ?? '' }
  }

  test('turned round it is driven the other way, its corners in the opposite order', async () => {
    const before = fieldsOf((await coach.get(circuit)).text)
    expect((await coach.post(circuit, { intent: 'reverse', ...(await way(coach)) })).status).toBe(200)
    const page = await coach.get(circuit)
    expect(wordsOf(page)).toMatch(/Direction clockwise/)
    expect(fieldsOf(page.text)['corners[0].id']).not.toBe(before['corners[0].id'])
    await coach.post(circuit, { intent: 'reverse', ...(await way(coach)) })
    expect(fieldsOf((await coach.get(circuit)).text)['corners[0].id']).toBe(before['corners[0].id'])
  })
  test('moved by two people at once it is shown in both versions', async () => {
    const seen = await way(coach)
    const move = { intent: 'start', startWay: 'ahead', startFrom: '' }
    expect((await manager.post(circuit, { ...move, ...seen, startMetres: '30' })).status).toBe(200)
    const answer = await coach.post(circuit, { ...move, ...seen, startMetres: '75' })
    expect(answer.status).toBe(409)
    expect(wordsOf(answer)).toMatch(/theirs 30 m along the drawn line.*yours 75 m along the drawn line/)
    const { startAlong, seenStart } = fieldsOf(answer.text)
    expect(
      (await coach.post(circuit, { intent: 'start-at', startAlong: startAlong!, seenStart: seenStart! })).status,
    ).toBe(200)
    expect((await way(coach)).seenStart).toBe('75')
  })
})
