import { demoBook, team } from './people'

/** Pages that anyone may open. */
export const openPages = ['/', '/sign-in']

/** Pages of the demo's team, one of each kind. */
export const teamPages = [
  team,
  `${team}/books`,
  `${team}/books/new`,
  `${team}/circuits`,
  `${team}/circuits/import`,
  `${team}/circuits/marram-head-circuit`,
  `${team}/cars`,
  demoBook,
  `${demoBook}?condition=wet`,
  `${demoBook}/corners/3`,
  `${demoBook}/corners/3?add=1`,
  `${demoBook}/corners/77`,
]

/** Whether the page can be moved sideways: how much wider than the window its content is, px. */
export const overflow = () => document.documentElement.scrollWidth - document.documentElement.clientWidth
