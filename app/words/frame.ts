/** The frame around a team's pages. */
export const frameWords = {
  allTeams: 'Turnstone: your teams',
  sections: 'Sections',
  team: 'Team',
  books: 'Books',
  circuits: 'Circuits',
  cars: 'Cars',
  teams: 'Teams',
  toTeams: 'To your teams',
  firstPage: 'To the first page',
  toTeam: 'To the team’s page',
} as const
