import { type Browser, expect, type Page, test } from '@playwright/test'
import { lineOf } from './support/corner'
import { demoBook, people, signIn } from './support/people'

const corner = `${demoBook}/corners/9`

/** Someone in a browser of his own, on the corner's page with the form of its apex open. */
async function atTheApex(browser: Browser, email: string): Promise<Page> {
  const context = await browser.newContext()
  const page = await context.newPage()
  await signIn(page, email)
  await page.goto(`${corner}?show=real`)
  await lineOf(page, 'Apex').getByRole('link', { name: 'Apex' }).click()
  await expect(page.getByRole('heading', { name: 'Apex real track' })).toBeVisible()
  return page
}

const metresOf = (page: Page) => page.getByLabel('Metres to the datum')
const save = (page: Page) => page.getByRole('button', { name: 'Save' }).click()

test.describe('two people change one mark', () => {
  test('its place: the second sees both versions and chooses', async ({ browser }) => {
    const coach = await atTheApex(browser, people.coach)
    const manager = await atTheApex(browser, people.manager)
    await metresOf(coach).fill('3')
    await save(coach)
    await expect(lineOf(coach, 'Apex')).toContainText(/\b3 (before|after)/)

    await metresOf(manager).fill('7')
    await save(manager)
    const conflict = manager.getByRole('alert')
    await expect(conflict).toContainText('Two people changed Apex. Keep one.')
    await expect(conflict).toContainText(/\b3\.0 (before|after)/)
    await expect(conflict).toContainText(/\b7\.0 (before|after)/)
    await expect(lineOf(manager, 'Apex')).toContainText(/\b3 (before|after)/)

    await conflict.getByRole('button', { name: 'Keep yours' }).click()
    await expect(conflict).toBeHidden()
    await expect(lineOf(manager, 'Apex')).toContainText(/\b7 (before|after)/)
    await coach.reload()
    await expect(lineOf(coach, 'Apex')).toContainText(/\b7 (before|after)/)
  })

  test('different fields: both stand', async ({ browser }) => {
    const coach = await atTheApex(browser, people.coach)
    const manager = await atTheApex(browser, people.manager)
    await coach.getByLabel('Speed, km/h').fill('93')
    await save(coach)
    await expect(lineOf(coach, 'Apex')).toContainText('93')

    await metresOf(manager).fill('11')
    await save(manager)
    await expect(lineOf(manager, 'Apex')).toContainText(/\b11 (before|after)/)
    await expect(lineOf(manager, 'Apex')).toContainText('93')
    await expect(manager.getByRole('alert')).toBeHidden()
  })
})
