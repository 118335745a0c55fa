/** Words of the page about one's own account. */
export const account = {
  kind: 'Account',
  company: 'Company',
  role: 'Role',
  email: 'E-mail',
  you: 'You',
  name: 'Name',
  language: 'Language',
  languages: { en: 'English', es: 'Español' },
  languageHint: 'Pour day and sign-in speak both; the office screens speak English.',
  save: 'Save',
  saved: 'Saved.',
  password: 'Password',
  currentPassword: 'Current password',
  newPassword: 'New password',
  changePassword: 'Change the password',
  passwordChanged: (ended: number) =>
    ended === 0
      ? 'The password is changed.'
      : `The password is changed; ${ended === 1 ? 'one other device was' : `${ended} other devices were`} signed out.`,
  sessions: 'Where you are signed in',
  since: (moment: string) => `since ${moment}`,
  until: (moment: string) => `ends by itself ${moment}`,
  otherDevice: 'another device',
  thisDevice: 'this device',
  endOthers: 'Sign out everywhere else',
  endedOthers: (ended: number) =>
    ended === 1 ? 'One other device was signed out.' : `${ended} other devices were signed out.`,
};

export type AccountMessages = typeof account;
