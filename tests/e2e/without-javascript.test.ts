import { expect, test } from '@playwright/test'
import { addMark, lineOf, toDatumOf } from './support/corner'
import { demoBook, signIn } from './support/people'

test.use({ javaScriptEnabled: false })

test('sign-in, list, corner, a mark added and taken back work before JavaScript', async ({ page }) => {
  await signIn(page)
  await page.goto(demoBook)
  await expect(page.getByRole('group', { name: 'Map of Marram Head Circuit' })).toBeVisible()
  const list = page.getByRole('table', { name: 'Corners in driving order' })
  await list.getByRole('link', { name: '12, Eelgrass' }).click()
  await expect(page.getByRole('heading', { name: 'Eelgrass', level: 1 })).toBeVisible()
  await expect(page.getByRole('img', { name: /^Map of Eelgrass/ })).toBeVisible()

  await addMark(page, { kind: 'Brake first', metres: '131', side: 'before', across: '0' })
  const brake = lineOf(page, 'Brake first')
  await expect(toDatumOf(page, 'Brake first')).toHaveText(/^131\sbefore$/)
  await page.getByRole('status').getByRole('button', { name: 'Undo' }).click()
  await expect(page.getByRole('status')).toContainText('Taken back')
  await expect(brake).toHaveCount(0)
})

test('what does not fit comes back with what was typed', async ({ page }) => {
  await signIn(page)
  await page.goto(`${demoBook}/corners/12?add=1`)
  const form = page.locator('form').filter({ has: page.getByRole('heading', { name: 'Add a mark' }) })
  await form.getByLabel('What happens').selectOption({ label: 'Apex' })
  await form.getByLabel('Metres to the datum').fill('near the post')
  await form.getByLabel('Speed, km/h').fill('1830')
  await form.getByRole('button', { name: 'Add mark' }).click()
  await expect(page.getByText('Metres to the datum, as a number from 0.')).toBeVisible()
  await expect(page.getByText('Over 500. Did you mean 183?')).toBeVisible()
  await expect(form.getByLabel('What happens')).toHaveValue('apex')
  await expect(form.getByLabel('Metres to the datum')).toHaveValue('near the post')
  await expect(form.getByLabel('Speed, km/h')).toHaveValue('1830')
})
