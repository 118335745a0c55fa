/** Words of sign-in, sign-up, invitation and password pages. */
export const auth = {
  language: 'Language',
  email: 'E-mail',
  password: 'Password',
  showPassword: 'Show',
  hidePassword: 'Hide',
  passwordHint: 'At least 10 characters. A short sentence is easy to keep in mind.',
  signIn: {
    kind: 'Sign in',
    title: 'Back to the ledger',
    submit: 'Sign in',
    forgot: 'Forgot the password?',
    noCompany: 'No company here yet?',
    signUp: 'Set one up',
  },
  demo: {
    title: (companyName: string) => `Look around as ${companyName}`,
    says: 'This installation carries an invented company. Take a person and press Sign in.',
    fill: (name: string, role: string) => `${name}, ${role}`,
  },
  signUp: {
    kind: 'Set up a company',
    title: 'Open a ledger',
    companyName: 'Company',
    timeZone: 'Time zone',
    timeZoneHint: 'Days and truck clocks are written in it.',
    name: 'Your name',
    submit: 'Set up the company',
    owner: 'You will be its owner: you invite the others and set what each may see.',
    haveOne: 'Already have a company here?',
  },
  forgot: {
    kind: 'Password',
    title: 'Get a new one by e-mail',
    says: 'We write to the address of your account with a link that lets you choose a new password.',
    submit: 'Send the link',
    done: 'If there is an account with this address, the link is on its way. It works once, for a short time.',
    noMail: 'Nothing came? The owner of your company can see the message in the outbox.',
    back: 'Back to sign-in',
  },
  reset: {
    kind: 'Password',
    title: 'Choose a new password',
    newPassword: 'New password',
    submit: 'Save and sign in',
    ends: 'Every other session of yours ends with it.',
  },
  invite: {
    kind: 'Invitation',
    title: (companyName: string) => `Join ${companyName}`,
    says: (role: string) => `You were invited as ${role}.`,
    name: 'Your name',
    password: 'Choose a password',
    submit: 'Join',
    deadTitle: 'This invitation does not work any more',
    deadSays:
      'It was used, withdrawn or is too old, or the link is incomplete. Ask the owner of the company for a new one.',
  },
};

export type AuthMessages = typeof auth;
