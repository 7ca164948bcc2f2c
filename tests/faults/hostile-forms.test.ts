/** Forms made to exhaust who takes them apart: what is let through makes an answer of about what was sent. */
import { parseWithZod } from '@conform-to/zod/v4'
import { expect, it } from 'vitest'
import { z } from 'zod'
import { MOST_FIELDS, MOST_PLACES } from '~/middleware/form-fields'
import { readForm } from '~/middleware/read-form.server'
import { readUpload } from '~/middleware/upload.server'

const address = 'http://localhost/sign-in'
const urlEncoded = 'application/x-www-form-urlencoded'
const encoded = (body: string) =>
  new Request(address, { method: 'POST', headers: { 'Content-Type': urlEncoded }, body })
function inParts(name: string, value: string): Request {
  const body = new FormData()
  body.append(name, value)
  return new Request(address, { method: 'POST', body })
}

const schema = z.object({
  email: z.string(),
  corners: z.array(z.object({ number: z.string(), name: z.string() })).optional(),
})
const names = (count: number, name: (i: number) => string) =>
  Array.from({ length: count }, (_, i) => `${name(i)}=a`).join('&')

const refused: Record<string, string> = {
  'a place far up a list': 'email[30000000]=a',
  'the same of objects': 'corners[30000000].name=a',
  'the same as a word': 'email[0]=a&email.30000000=a',
  'a length': 'email[0]=a&email.length=4000000000',
  'lists in lists': names(2000, (i) => `corners[${i % 500}].corners[499]`),
  'places, many': `corners[${MOST_PLACES}].name=a`,
  'fields, many': names(MOST_FIELDS + 1, () => 'email'),
  'nothing but separators': '&'.repeat(1_000_000),
  depth: `email${'[0]'.repeat(100_000)}=a`,
  'one long name': `${'a'.repeat(900_000)}=a`,
  'the parent of all objects': '__proto__.email=a',
  'a reserved word of forms': '__intent__={&__state__={',
  'an order to change a list': `__intent__=${encodeURIComponent('{"type":"insert","payload":{"name":"email","index":30000000}}')}`,
}

it.each(Object.entries(refused))('%s is refused', async (_what, body) => {
  await expect(readForm(encoded(body))).rejects.toMatchObject({ init: { status: 400 } })
})

it.each(['email[30000000]', '__proto__.email', 'a'.repeat(101)])('an upload’s field “%s” too', async (name) => {
  expect(await readUpload(inParts('email', 'b'))).not.toBeNull()
  expect(await readUpload(inParts(name, 'b'))).toBeNull()
})

it('an upload’s fields lose control characters too', async () => {
  expect((await readUpload(inParts('name', 'Marram\u0000 Head')))?.get('name')).toBe('Marram Head')
})

it('control characters are taken out of what was sent in an address’s letters', async () => {
  expect((await readForm(encoded('name=Marram%00%0BHead%0A2'))).get('name')).toBe('MarramHead\n2')
})

const accepted: Record<string, string> = {
  'as many fields as may be': names(MOST_FIELDS, () => 'email'),
  'a list as long as may be': `corners[${MOST_PLACES - 1}].name=a`,
  'as many names as may be': names(MOST_FIELDS, (i) => `a${i}.b.c.d`),
}

it.each(Object.entries(accepted))('%s makes no large answer', async (_what, body) => {
  const submission = parseWithZod(await readForm(encoded(body)), { schema })
  expect(submission.status).toBe('error')
  expect(JSON.stringify(submission.reply()).length).toBeLessThan(5 * body.length + 200 * MOST_PLACES)
})
