import { readFileSync } from 'node:fs'
import { beforeAll, describe, expect, test } from 'vitest'
import { type Answer, baseUrl, send } from './send'
import { signIn, type Visitor, wordsOf } from './visitor'

const TEAM = '/teams/lanternside'
const IMPORT = `${TEAM}/circuits/import`
const sample = (name: string) => readFileSync(`tests/fixtures/circuits/${name}`)
let coach: Visitor

beforeAll(async () => {
  coach = await signIn('coach')
})

const upload = (name: string, bytes: Uint8Array | string) =>
  coach.upload(IMPORT, { name, bytes: Buffer.from(bytes) }, { name: 'Tide Pool' })

/** The form again with what was typed, no inside of the program. */
function refused(answer: Answer, message: RegExp) {
  expect(answer.status).toBe(400)
  expect(wordsOf(answer)).toMatch(message)
  expect(answer.text).toContain('value="Tide Pool"')
  expect(answer.text).not.toMatch(/\bat .*\.[jt]s:\d+|node_modules/)
}

describe('a file that is no circuit is told so at its field, and nothing is kept', () => {
  test('none', async () => {
    refused(
      await coach.upload(IMPORT, { name: '', bytes: Buffer.from('') }, { name: 'Tide Pool' }),
      /Choose the circuit’s file\./,
    )
  })
  test('an empty one', async () => {
    refused(await upload('lap.gpx', ''), /lap\.gpx is empty\./)
  })
  test('a picture under another name', async () => {
    const png = Buffer.from('89504e470d0a1a0a0000000d49484452000000010000000108020000', 'hex')
    refused(await upload('lap.geojson', png), /lap\.geojson: .*picture/)
  })
  test('one with a document type declaration', async () => {
    const text = '<?xml version="1.0"?><!DOCTYPE gpx [<!ENTITY a SYSTEM "file:///etc/passwd">]><gpx>&a;</gpx>'
    const answer = await upload('lap.gpx', text)
    refused(answer, /lap\.gpx, line 1: .*document type/)
    expect(answer.text).not.toContain('root:')
  })
  test('one larger than 20 MB', async () => {
    refused(await upload('lap.csv', Buffer.alloc(20 * 1024 * 1024 + 10, '1')), /lap\.csv is larger than 20 MB\./)
  })
  test('one with a name that would be markup', async () => {
    const answer = await upload('<img src=x onerror=alert(1)>.gpx', 'no file')
    expect(answer.text).not.toContain('<img src=x')
    refused(answer, /onerror/)
  })
})

describe('a request that is no form', () => {
  test('a body that breaks off is told so', async () => {
    const headers = {
      Cookie: coach.cookie,
      Origin: baseUrl,
      'Content-Type': 'multipart/form-data; boundary=lost',
    }
    const body = '--lost\r\nContent-Disposition: form-data; name="file"; filename="lap.gpx"\r\n\r\n<gpx>'
    const answer = await send(IMPORT, { method: 'POST', headers, body })
    expect(answer.status).toBe(400)
    expect(wordsOf(answer)).toContain('The file did not arrive whole.')
  })
  test('fields without a file are told so', async () => {
    const answer = await coach.post(IMPORT, { name: 'Tide Pool' })
    refused(answer, /Choose the circuit’s file\./)
  })
})

describe('a circuit on its way in', () => {
  const draftOf = async (name: string) => {
    const answer = await upload(name, sample(name))
    expect(answer.status).toBe(302)
    return String(answer.headers.location)
  }

  test('is told with its length, direction, heights and proposed corners', async () => {
    const words = wordsOf(await coach.get(await draftOf('sandbar.kml')))
    expect(words).toContain('Does this look right?')
    expect(words).toMatch(/Length 3\.10.km/)
    expect(words).toMatch(/Direction anticlockwise/)
    expect(words).toMatch(/Heights 4 to 28.m/)
    expect(words).toMatch(/Corners 8/)
  })
  test('turned round it is driven the other way, and what was typed stays', async () => {
    const path = await draftOf('sandbar.kml')
    const turned = await coach.post(path, { intent: 'reverse', name: 'Tide Pool Ring', roadWidth: '11,5' })
    expect(turned.headers.location).toBe(path)
    const page = await coach.get(path)
    expect(wordsOf(page)).toMatch(/Direction clockwise/)
    expect(page.text).toContain('value="Tide Pool Ring"')
    expect(page.text).toContain('value="11,5"')
  })
  test('in metres it asks for its place on the globe and takes it', async () => {
    const path = await draftOf('sandbar-metres.csv')
    expect(wordsOf(await coach.get(path))).toContain('The file gives metres')
    const wrong = await coach.post(path, { intent: 'anchor', longitude: '212', latitude: '54.2' })
    expect(wrong.status).toBe(400)
    expect(wordsOf(wrong)).toContain('Longitude goes from −180 to 180.')
    expect(wrong.text).toContain('value="212"')
    expect((await coach.post(path, { intent: 'anchor', longitude: '-12,6', latitude: '54.2' })).status).toBe(302)
    expect(wordsOf(await coach.get(path))).toContain('Does this look right?')
  })
  test('kept without a zone, a width or a good number it is told each at its place, and nothing is kept', async () => {
    const path = await draftOf('sandbar.kml')
    const keys = [...(await coach.get(path)).text.matchAll(/name="corners\[\d+\]\.key" value="(\d+)"/g)].map(
      ([, key]) => key!,
    )
    const rows = keys.flatMap((key, i) => [
      [`corners[${i}].key`, key],
      [`corners[${i}].accept`, 'on'],
      [`corners[${i}].number`, i === 1 ? '1' : i === 2 ? 'two' : String(i + 1)],
      [`corners[${i}].name`, i === 0 ? 'Sandspit' : ''],
    ])
    const fields = { intent: 'save', name: 'Tide Pool', layout: 'Full circuit', ...Object.fromEntries(rows) }
    const answer = await coach.post(path, fields)
    expect(answer.status).toBe(400)
    const words = wordsOf(answer)
    expect(words).toContain('Choose its zone.')
    expect(words).toContain('Give it in metres; 12 is usual.')
    expect(words).toContain('1 is there twice.')
    expect(words).toContain('A number, with a letter where needed: 7 or 7A.')
    expect(answer.text).toContain('value="Sandspit"')
    expect(wordsOf(await coach.get(`${TEAM}/circuits`))).not.toContain('Tide Pool')
  })
  test('given up it is gone', async () => {
    const path = await draftOf('sandbar.kml')
    expect((await coach.post(path, { intent: 'cancel' })).headers.location).toBe(`${TEAM}/circuits`)
    expect((await coach.get(path)).status).toBe(404)
  })
})
