import { expect, type Locator, type Page, test } from '@playwright/test'
import { handleOf, toDatumOf } from './support/corner'
import { password, people, team } from './support/people'

test.setTimeout(180_000)

const mostTabs = 120

/** Presses Tab until the element has the focus; every stop on the way shows where the focus is. */
async function tabTo(page: Page, target: Locator) {
  await expect(target).toBeVisible()
  for (let i = 0; i < mostTabs; i++) {
    await page.keyboard.press('Tab')
    if (await target.evaluate((element) => element === document.activeElement)) return
  }
  throw new Error(`not reached by ${mostTabs} presses of Tab`)
}

test('from sign-in to a mark nudged, by keyboard alone', async ({ page }) => {
  await page.goto('/')
  await tabTo(page, page.getByLabel('Email'))
  await page.keyboard.type(people.coach)
  await page.keyboard.press('Tab')
  await page.keyboard.type(password)
  await page.keyboard.press('Enter')
  await page.waitForURL(`**${team}`)

  await tabTo(page, page.getByRole('link', { name: /Marram Head/ }).first())
  await page.keyboard.press('Enter')
  const list = page.getByRole('table', { name: 'Corners in driving order' })
  await tabTo(page, list.getByRole('link', { name: '10, Shingle' }))
  await page.keyboard.press('Enter')
  await expect(page.getByRole('heading', { name: 'Shingle', level: 1 })).toBeVisible()

  const handle = handleOf(page, /^Turn in, .*real track/)
  await tabTo(page, handle)
  const before = Number(/(\d+)\sbefore/.exec((await handle.getAttribute('aria-label')) ?? '')?.[1])
  await page.keyboard.press('Shift+ArrowUp')
  await expect(toDatumOf(page, 'Turn in')).toContainText(`${before - 10}`)
  await expect(page.getByRole('button', { name: /^Undo: turn in moved 10/ })).toBeVisible()
  await page.reload()
  await expect(toDatumOf(page, 'Turn in')).toContainText(`${before - 10}`)
})
