import { expect, type Locator, type Page } from '@playwright/test'

/** What a test types into the form of a new mark. */
export interface TypedMark {
  kind: string
  metres?: string
  side?: 'before' | 'after'
  across?: string
  hand?: 'left' | 'right'
  speed?: string
}

/** Fills the open form of a new mark; what is left out stays as the form has it. */
export async function fillMark(page: Page, mark: TypedMark) {
  const form = page.locator('form').filter({ has: page.getByRole('heading', { name: 'Add a mark' }) })
  await form.getByLabel('What happens').selectOption({ label: mark.kind })
  if (mark.metres !== undefined) await form.getByLabel('Metres to the datum').fill(mark.metres)
  if (mark.side !== undefined) await form.getByLabel('Which side of it').selectOption(mark.side)
  if (mark.across !== undefined) await form.getByLabel('Metres from the middle').fill(mark.across)
  if (mark.hand !== undefined) await form.getByLabel('To which side').selectOption(mark.hand)
  if (mark.speed !== undefined) await form.getByLabel('Speed, km/h').fill(mark.speed)
}

/** Adds a mark by its form and waits until the book has it. */
export async function addMark(page: Page, mark: TypedMark) {
  await page.getByRole('link', { name: 'Add mark' }).click()
  await fillMark(page, mark)
  await page.getByRole('button', { name: 'Add mark' }).click()
  await expect(page.getByRole('status').filter({ hasText: `${mark.kind} added` })).toBeVisible()
}

/** A mark's line in the table of marks. */
export const lineOf = (page: Page, name: string): Locator =>
  page
    .getByRole('table', { name: /^Marks of / })
    .getByRole('row')
    .filter({ has: page.getByRole('rowheader', { name }) })

/** How far a mark is from the datum, as its line says it: "133 before". */
export const toDatumOf = (page: Page, name: string): Locator => lineOf(page, name).getByRole('cell').first()

/** Metres to the next mark, as the mark's line says them now. */
export async function toNextOf(page: Page, name: string): Promise<number> {
  const said = await lineOf(page, name).getByRole('cell').last().textContent()
  return Number(/^(\d+)\s*m/.exec(said ?? '')?.[1])
}

/** A mark on the map, once the map can be moved. */
export const handleOf = (page: Page, label: string | RegExp): Locator =>
  page.getByRole('group', { name: /^Map of / }).getByRole('button', { name: label })

/** Middle of an element in px of the window. */
export async function middleOf(locator: Locator): Promise<{ x: number; y: number }> {
  const box = await locator.boundingBox()
  if (!box) throw new Error('it is not on the page')
  return { x: box.x + box.width / 2, y: box.y + box.height / 2 }
}
