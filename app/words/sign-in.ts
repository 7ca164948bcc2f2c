/** The sign-in form and what it says of what was typed. */
export const signInWords = {
  title: 'Sign in',
  email: 'Email',
  password: 'Password',
  button: 'Sign in',
  emailMissing: 'Which address do you sign in with?',
  emailWrong: 'That is no e-mail address.',
  passwordMissing: 'The password is missing.',
  signOut: 'Sign out',
  goOn: (name: string) => `You are signed in as ${name}.`,
  toTeams: 'Go to your teams',
} as const
