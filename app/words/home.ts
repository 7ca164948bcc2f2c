/** The first page: what Turnstone is for, to a driver or a coach who has never seen it. */
export const homeWords = {
  title: 'The simulator taught you the corner. The ground will move your marks.',
  lead:
    'Turnstone is the book a driver and a coach keep for one circuit and one car. Tie every mark to something you can ' +
    'see from the seat. Hold what the simulator taught against what you found on foot. Say of each place whether it was ' +
    'told, seen on foot or driven.',
  uses: [
    { when: 'Before.', what: 'Mark the corner from the simulator, hollow. The coach corrects it.' },
    { when: 'At the track.', what: 'Set the real place beside it, solid. See how much sooner or later it is here.' },
    { when: 'Between sessions.', what: 'One corner at a time: what marks it, how far before, who has proved it.' },
  ],
  toTeams: 'Go to your teams',
  drawing: 'A corner with its marks, unrolled straight',
} as const
