import { AxeBuilder } from '@axe-core/playwright'
import { expect, type Page, test } from '@playwright/test'
import { openPages, overflow, teamPages } from './support/pages'
import { signIn } from './support/people'

test.setTimeout(600_000)

const sizes = { desktop: { width: 1440, height: 900 }, phone: { width: 390, height: 844 } }

/** What axe finds of serious or critical weight, one line each. By night only the colours are others. */
async function found(page: Page, colorScheme: 'light' | 'dark'): Promise<string[]> {
  await page.emulateMedia({ colorScheme, reducedMotion: 'reduce' })
  const axe = new AxeBuilder({ page })
  const { violations } = await (colorScheme === 'light' ? axe : axe.withRules('color-contrast')).analyze()
  return violations
    .filter(({ impact }) => impact === 'serious' || impact === 'critical')
    .flatMap(({ id, nodes }) =>
      nodes.map(({ target }) => `${colorScheme} ${new URL(page.url()).pathname} ${id} ${target.join(' ')}`),
    )
}

async function foundIn(page: Page, paths: readonly string[]): Promise<string[]> {
  const all: string[] = []
  for (const path of paths) {
    await page.goto(path)
    await expect(page.getByRole('heading', { level: 1 }).first()).toBeAttached()
    all.push(...(await found(page, 'light')), ...(await found(page, 'dark')))
  }
  return all
}

for (const [size, viewport] of Object.entries(sizes)) {
  test.describe(`on a ${size}, by day and by night`, () => {
    test.use({ viewport })

    test('pages open to anyone have no serious fault', async ({ page }) => {
      expect(await foundIn(page, openPages)).toEqual([])
    })

    test('a team’s pages have no serious fault', async ({ page }) => {
      await signIn(page)
      expect(await foundIn(page, teamPages)).toEqual([])
    })
  })
}

test.describe('at 320 px', () => {
  test.use({ viewport: { width: 320, height: 700 } })

  test('no page moves sideways', async ({ page }) => {
    await signIn(page)
    const wide: string[] = []
    for (const path of [...openPages, ...teamPages]) {
      await page.goto(path)
      await expect(page.getByRole('heading', { level: 1 }).first()).toBeAttached()
      const by = await page.evaluate(overflow)
      if (by > 0) wide.push(`${path} by ${by} px`)
    }
    expect(wide).toEqual([])
  })
})
