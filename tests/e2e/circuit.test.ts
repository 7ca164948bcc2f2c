import { type Browser, expect, type Page, test } from '@playwright/test'
import { people, signIn, team } from './support/people'

const circuit = `${team}/circuits/marram-head-circuit`

async function onTheCircuit(browser: Browser, email: string): Promise<Page> {
  const page = await (await browser.newContext()).newPage()
  await signIn(page, email)
  await page.goto(circuit)
  await expect(page.getByRole('button', { name: 'Closer' })).toBeVisible()
  return page
}

test.setTimeout(180_000)

const nameOf = (page: Page, number: string) => page.getByLabel(`Name of corner ${number}`, { exact: true })
const keep = (page: Page) => page.getByRole('button', { name: 'Keep names and numbers' }).click()
const undo = (page: Page) => page.getByRole('status').getByRole('button', { name: 'Undo' }).click()

test('two people rename one corner: the second sees both versions, and keeps his or theirs', async ({ browser }) => {
  const coach = await onTheCircuit(browser, people.coach)
  const manager = await onTheCircuit(browser, people.manager)
  await nameOf(manager, '2').fill('Groyne Bend')
  await keep(manager)
  await expect(manager.getByRole('status')).toContainText('1 change kept.')

  await nameOf(coach, '2').fill('The Groyne')
  await nameOf(coach, '5').fill('Slip')
  await keep(coach)
  const conflict = coach.getByRole('alert')
  await expect(conflict).toContainText('Two people changed corner 2 Groyne Bend. Keep one.')
  await expect(conflict).toContainText('The Groyne')
  await expect(nameOf(coach, '5')).toHaveValue('Slip')
  await conflict.getByRole('button', { name: 'Keep theirs' }).click()
  await expect(coach.getByRole('status')).toContainText('1 change kept.')
  await expect(nameOf(coach, '2')).toHaveValue('Groyne Bend')
  await expect(nameOf(coach, '5')).toHaveValue('Slip')
  await undo(coach)
  await expect(nameOf(coach, '5')).toHaveValue('Slipway')

  await nameOf(coach, '2').fill('Groin')
  await keep(coach)
  await nameOf(manager, '2').fill('Groyne')
  await keep(manager)
  await manager.getByRole('alert').getByRole('button', { name: 'Keep yours' }).click()
  await expect(manager.getByRole('alert')).toBeHidden()
  await expect(nameOf(manager, '2')).toHaveValue('Groyne')
  await coach.reload()
  await expect(nameOf(coach, '2')).toHaveValue('Groyne')
})

test('the start line is dragged along the road, and that is taken back', async ({ browser }) => {
  const page = await onTheCircuit(browser, people.coach)
  const tightest = page.getByRole('table').getByRole('row').nth(1).getByRole('cell').last()
  await expect(tightest).toHaveText('392')
  const handle = page.getByRole('button', { name: /^Start line/ })
  const box = await handle.boundingBox()
  if (!box) throw new Error('no start line to take hold of')
  const [x, y] = [box.x + box.width / 2, box.y + box.height / 2]
  await page.mouse.move(x, y)
  await page.mouse.down()
  await page.mouse.move(x + 60, y, { steps: 6 })
  await page.mouse.up()
  await expect(page.getByRole('status')).toContainText('1 change kept.')
  await expect(tightest).not.toHaveText('392')
  await undo(page)
  await expect(tightest).toHaveText('392')
})
