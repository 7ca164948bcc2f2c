import { expect, type Page, test } from '@playwright/test'
import { addMark, fillMark, handleOf, lineOf, middleOf, toDatumOf, toNextOf } from './support/corner'
import { signIn, team } from './support/people'

const file = 'tests/fixtures/circuits/sandbar.gpx'
/** Length of the team's car, m. */
const carLength = 4.6

/** A distance before the datum, to the metre, as the table says it. */
const before = (metres: number) => new RegExp(`^${Math.round(metres)}\\sbefore$`)

/** Brings the sample circuit in and keeps what is proposed; answers with the number of corners. */
async function bringIn(page: Page, name: string): Promise<number> {
  await page.goto(`${team}/circuits`)
  await page.getByRole('link', { name: 'Bring a circuit in' }).click()
  await page.getByLabel('Name of the circuit').fill(name)
  await page.getByLabel('File').setInputFiles(file)
  await page.getByRole('button', { name: 'Read the file' }).click()
  await expect(page.getByRole('heading', { name: 'Does this look right?' })).toBeVisible()
  const corners = await page.getByRole('checkbox', { name: /^Keep corner/ }).count()
  await page.getByLabel('Name of corner 1', { exact: true }).fill('Sandspit')
  await page.getByLabel('Time zone').selectOption('Atlantic/Reykjavik')
  await page.getByLabel('Road width, m').fill('12')
  await page.getByRole('button', { name: 'Keep the circuit' }).click()
  await expect(page.getByRole('heading', { name, level: 1 })).toBeVisible()
  return corners
}

test.setTimeout(180_000)

test('a circuit file becomes a book with marks and distances', async ({ page }) => {
  await signIn(page)
  const corners = await bringIn(page, 'Sandbar Loop')
  expect(corners).toBeGreaterThan(5)
  await page.getByRole('link', { name: 'Make a book for it' }).click()
  await page.getByLabel('Name of the book').fill('Sandbar')
  await page.getByRole('button', { name: 'Make the book' }).click()

  const list = page.getByRole('table', { name: 'Corners in driving order' })
  await expect(list.getByRole('row')).toHaveCount(corners + 1)
  await page.getByRole('link', { name: 'Start with 1 Sandspit' }).click()

  // Typed: 60 m apart in the middle of the approach, which is straight there.
  await addMark(page, { kind: 'Brake first', metres: '150', side: 'before', across: '0', speed: '180' })
  await addMark(page, { kind: 'Turn in', metres: '90', side: 'before', across: '0', speed: '144' })
  const brake = lineOf(page, 'Brake first')
  await expect(toDatumOf(page, 'Brake first')).toHaveText(before(150))
  // 60 m are 60 / 4.6 car lengths; from 50 m/s to 40 m/s they take 2 × 60 / (50 + 40) s.
  await expect(brake).toContainText('60 m')
  await expect(brake).toContainText(`${(60 / carLength).toFixed(1)} lengths`)
  await expect(brake).toContainText('1.33 s')

  // Tapped halfway between the two on the map: 120 m before the datum, in the middle of the road.
  const from = await middleOf(handleOf(page, /^Brake first/))
  const to = await middleOf(handleOf(page, /^Turn in/))
  await page.mouse.click((from.x + to.x) / 2, (from.y + to.y) / 2)
  const metres = page.getByLabel('Metres to the datum')
  await expect(metres).not.toHaveValue('')
  const tapped = Number(await metres.inputValue())
  expect(Math.abs(tapped - 120)).toBeLessThan(1)
  expect(Math.abs(Number(await page.getByLabel('Metres from the middle').inputValue()))).toBeLessThan(1)
  await fillMark(page, { kind: 'Brake off' })
  await page.getByRole('button', { name: 'Add mark' }).click()
  await expect(toDatumOf(page, 'Brake off')).toHaveText(before(tapped))

  // Nudged by keyboard: ten metres further on, and one more.
  await handleOf(page, /^Brake off/).focus()
  await page.keyboard.press('Shift+ArrowUp')
  const undoTen = page.getByRole('button', { name: /^Undo: brake off moved 10/ })
  await expect(undoTen).toBeVisible()
  await page.keyboard.press('ArrowUp')
  const undoOne = page.getByRole('button', { name: /^Undo: brake off moved 1\b/ })
  await expect(undoOne).toBeVisible()
  await expect(toDatumOf(page, 'Brake off')).toHaveText(before(tapped - 11))
  expect(Math.abs((await toNextOf(page, 'Brake first')) - (150 - (tapped - 11)))).toBeLessThan(0.6)
  expect(Math.abs((await toNextOf(page, 'Brake off')) - (tapped - 11 - 90))).toBeLessThan(0.6)

  await page.reload()
  await expect(toDatumOf(page, 'Brake off')).toHaveText(before(tapped - 11))
  await expect(toDatumOf(page, 'Brake first')).toHaveText(before(150))
  await expect(toDatumOf(page, 'Turn in')).toHaveText(before(90))

  await undoOne.click()
  await expect(toDatumOf(page, 'Brake off')).toHaveText(before(tapped - 10))
  await undoTen.click()
  await expect(toDatumOf(page, 'Brake off')).toHaveText(before(tapped))
})
