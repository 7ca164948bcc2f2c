import { type Browser, expect, type Page, test } from '@playwright/test'
import { lineOf, toDatumOf } from './support/corner'
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
    await expect(toDatumOf(coach, 'Apex')).toHaveText(/^3\s(before|after)$/)

    await metresOf(manager).fill('7')
    await save(manager)
    const conflict = manager.getByRole('alert')
    await expect(conflict).toContainText('Two people changed Apex. Keep one.')
    await expect(conflict).toContainText(/Theirs3\.0\s(before|after)/)
    await expect(conflict).toContainText(/Yours7\.0\s(before|after)/)

    await conflict.getByRole('button', { name: 'Keep yours' }).click()
    await expect(conflict).toBeHidden()
    await expect(toDatumOf(manager, 'Apex')).toHaveText(/^7\s(before|after)$/)
    await coach.reload()
    await expect(toDatumOf(coach, 'Apex')).toHaveText(/^7\s(before|after)$/)
  })

  test('different fields: both stand', async ({ browser }) => {
    const coach = await atTheApex(browser, people.coach)
    const manager = await atTheApex(browser, people.manager)
    await coach.getByLabel('Speed, km/h').fill('93')
    await save(coach)
    await expect(lineOf(coach, 'Apex')).toContainText('93')

    await metresOf(manager).fill('11')
    await save(manager)
    await expect(toDatumOf(manager, 'Apex')).toHaveText(/^11\s(before|after)$/)
    await expect(lineOf(manager, 'Apex')).toContainText('93')
    await expect(manager.getByRole('alert')).toBeHidden()
  })
})
