import type { Role } from '~/book/kinds'
import { roleWord } from './kinds'

/** The list of a person's teams, and a team's first page. */
export const teamWords = {
  teams: 'Your teams',
  role: (role: Role) => `you are ${roleWord(role)}`,
  noTeam: 'You are in no team yet.',
  noTeamQuestion: 'Who runs your car? The team’s manager can take you in.',
  books: 'Books',
  allBooks: 'All books',
  newBook: 'Start a book',
  noBook: 'No book yet.',
  noBookQuestion: 'Which circuit do you go to next?',
  circuits: 'Circuits',
  allCircuits: 'All circuits',
  noCircuit: 'No circuit yet.',
  noCircuitQuestion: 'Have you a lap of it, or its centreline, as a file?',
  bringIn: 'Bring a circuit in',
  inBook: (book: string) => `Open ${book}`,
  deskOnly: 'Coaches and managers do this.',
} as const
