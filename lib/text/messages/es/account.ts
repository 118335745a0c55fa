import type { AccountMessages } from '../en/account';

/** Las palabras de la página de la cuenta propia. */
export const account: AccountMessages = {
  kind: 'Mi cuenta',
  company: 'Empresa',
  role: 'Puesto',
  email: 'Correo electrónico',
  you: 'Usted',
  name: 'Nombre',
  language: 'Idioma',
  languages: { en: 'English', es: 'Español' },
  languageHint: 'El día de colado y la entrada hablan los dos; la oficina habla inglés.',
  save: 'Guardar',
  saved: 'Guardado.',
  password: 'Contraseña',
  currentPassword: 'Contraseña actual',
  newPassword: 'Contraseña nueva',
  changePassword: 'Cambiar la contraseña',
  passwordChanged: (ended) =>
    ended === 0
      ? 'La contraseña cambió.'
      : `La contraseña cambió; ${ended === 1 ? 'se cerró la sesión en otro aparato' : `se cerró la sesión en otros ${ended} aparatos`}.`,
  sessions: 'Dónde tiene la sesión abierta',
  since: (moment) => `desde ${moment}`,
  until: (moment) => `se cierra sola ${moment}`,
  otherDevice: 'otro aparato',
  thisDevice: 'este aparato',
  endOthers: 'Cerrar en todos los demás',
  endedOthers: (ended) =>
    ended === 1
      ? 'Se cerró la sesión en otro aparato.'
      : `Se cerró la sesión en otros ${ended} aparatos.`,
};
