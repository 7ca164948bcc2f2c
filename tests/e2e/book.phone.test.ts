import { expect, type Page, test } from '@playwright/test'
import { addMark, lineOf } from './support/corner'
import { overflow } from './support/pages'
import { demoBook, signIn } from './support/people'

const leastTarget = 44

/** Links, buttons and fields that a finger must hit and that are lower than 44 px, with their names. */
async function lowTargets(page: Page): Promise<string[]> {
  return page.evaluate((least) => {
    const targets = [
      ...document.querySelectorAll<HTMLElement>('a[href], button, select, summary, input:not([type=hidden])'),
    ]
    const seen = (element: HTMLElement) =>
      element.checkVisibility({ visibilityProperty: true }) && element.tabIndex >= 0
    const name = (element: HTMLElement) => element.getAttribute('aria-label') ?? element.textContent ?? element.tagName
    const heightOf = (element: HTMLElement) => {
      // A row that is one link is hit anywhere in the row; a plate of a drawing lies in its own wide target.
      const row = element.classList.contains('row-link') ? element.closest('tr') : null
      return (row ?? element).getBoundingClientRect().height
    }
    return targets
      .filter((element) => seen(element) && !element.closest('svg') && heightOf(element) < least - 0.5)
      .map((element) => `${name(element).trim()}: ${Math.round(heightOf(element))}`)
  }, leastTarget)
}

test.beforeEach(({ page }) => signIn(page))

test('the overview: the circuit over the list, rows for a finger, nothing sideways', async ({ page }) => {
  await page.goto(demoBook)
  const map = page.getByRole('group', { name: 'Map of Marram Head Circuit' })
  const list = page.getByRole('table', { name: 'Corners in driving order' })
  const [mapBox, listBox] = [await map.boundingBox(), await list.boundingBox()]
  expect(mapBox!.y + mapBox!.height).toBeLessThanOrEqual(listBox!.y)
  expect(mapBox!.width).toBeGreaterThan(300)
  expect(await page.evaluate(overflow)).toBe(0)
  expect(await lowTargets(page)).toEqual([])
})

test('letters of a drawing are 14 px or more', async ({ page }) => {
  await page.goto(demoBook)
  const sizes = await page
    .getByRole('group', { name: 'Map of Marram Head Circuit' })
    .locator('text')
    .evaluateAll((texts) => texts.map((text) => text.getBoundingClientRect().height / 1.2))
  expect(Math.min(...sizes)).toBeGreaterThan(13)
})

test('a tap on a row opens the corner; the next corner is a tap away', async ({ page }) => {
  await page.goto(demoBook)
  const list = page.getByRole('table', { name: 'Corners in driving order' })
  await list.getByRole('row').filter({ hasText: 'Limpet' }).tap()
  await expect(page.getByRole('heading', { name: 'Limpet', level: 1 })).toBeVisible()
  await page.getByRole('link', { name: '9 Boathouse' }).tap()
  await expect(page.getByRole('heading', { name: 'Boathouse', level: 1 })).toBeVisible()
})

test('the corner: targets for a finger, nothing sideways, a mark added and taken back', async ({ page }) => {
  await page.goto(`${demoBook}/corners/8`)
  expect(await page.evaluate(overflow)).toBe(0)
  expect(await lowTargets(page)).toEqual([])
  await addMark(page, { kind: 'Lift', metres: '141', side: 'before', across: '0' })
  await expect(lineOf(page, 'Lift')).toContainText('141')
  await page.getByRole('status').getByRole('button', { name: 'Undo' }).tap()
  await expect(lineOf(page, 'Lift')).toHaveCount(0)
})
