import type { Page } from '@playwright/test'

/** The demo's people by role. */
export const people = {
  manager: 'mona@lanternside.example',
  coach: 'teodora@lanternside.example',
  driver: 'ilse@lanternside.example',
  otherDriver: 'rafi@lanternside.example',
} as const

export const password = process.env.DEMO_PASSWORD ?? ''
export const team = '/teams/lanternside'
export const demoBook = `${team}/books/marram-head`

/** Signs in by the form and waits for the team's page. */
export async function signIn(page: Page, email: string = people.coach) {
  await page.goto('/sign-in')
  await page.getByLabel('Email').fill(email)
  await page.getByLabel('Password').fill(password)
  await page.getByRole('button', { name: 'Sign in' }).click()
  await page.waitForURL(`**${team}`)
}
