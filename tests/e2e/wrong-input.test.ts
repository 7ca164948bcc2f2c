import { expect, type Page, test } from '@playwright/test'
import { signIn, team } from './support/people'

test.beforeEach(async ({ page }) => {
  await signIn(page)
  await page.goto(`${team}/circuits/import`)
  await page.getByLabel('Name of the circuit').fill('Tide Pool')
})

async function send(page: Page, name: string, content: string) {
  await page
    .getByLabel('File')
    .setInputFiles({ name, mimeType: 'application/octet-stream', buffer: Buffer.from(content) })
  await page.getByRole('button', { name: 'Read the file' }).click()
}

/** The page is still there, says what is wrong with the file, keeps what was typed, shows no inside of the program. */
async function refused(page: Page, message: string | RegExp) {
  await expect(page.getByText(message)).toBeVisible()
  await expect(page.getByLabel('Name of the circuit')).toHaveValue('Tide Pool')
  await expect(page).toHaveURL(/\/circuits\/import$/)
  await expect(page.locator('body')).not.toContainText(/\bat .*\.[jt]s:\d+/)
}

test('no file at all', async ({ page }) => {
  await page.getByRole('button', { name: 'Read the file' }).click()
  await refused(page, 'Choose the circuit’s file.')
})

test('an empty file', async ({ page }) => {
  await send(page, 'lap.gpx', '')
  await refused(page, 'lap.gpx is empty. Export it again, then bring that in.')
})

test('a file that is not what its name says', async ({ page }) => {
  await send(page, 'lap.gpx', 'sector 1 34.2\nsector 2 28.9\n')
  await refused(page, /lap\.gpx/)
})

test('a picture', async ({ page }) => {
  await send(page, 'map.geojson', '\u0089PNG\r\n\u001a\n\u0000\u0000\u0000\rIHDR')
  await refused(page, /map\.geojson/)
})

test('a line whose axes are swapped', async ({ page }) => {
  const coordinates = Array.from({ length: 40 }, (_, i) => {
    const turn = (2 * Math.PI * i) / 40
    return [54.2 + 0.004 * Math.sin(turn), -112.6 + 0.004 * Math.cos(turn)]
  })
  await send(page, 'lap.geojson', JSON.stringify({ type: 'LineString', coordinates }))
  await refused(page, /lap\.geojson/)
})

test('a wrong password says so and keeps the address', async ({ browser }) => {
  const page = await (await browser.newContext()).newPage()
  await page.goto('/sign-in')
  await page.getByLabel('Email').fill('rafi@lanternside.example')
  await page.getByLabel('Password').fill('not his password')
  await page.getByRole('button', { name: 'Sign in' }).click()
  await expect(page.getByRole('alert')).toContainText('That did not let you in.')
  await expect(page.getByLabel('Email')).toHaveValue('rafi@lanternside.example')
})

test('another team’s pages do not exist', async ({ page }) => {
  const answer = await page.goto('/teams/greyholm')
  expect(answer?.status()).toBe(404)
  await expect(page.getByRole('heading', { level: 1 })).toBeVisible()
})
