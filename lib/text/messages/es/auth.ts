import type { AuthMessages } from '../en/auth';

/** Las palabras de las páginas de entrada, invitación y contraseña. */
export const auth: AuthMessages = {
  language: 'Idioma',
  email: 'Correo electrónico',
  password: 'Contraseña',
  showPassword: 'Ver',
  hidePassword: 'Ocultar',
  passwordHint: 'Al menos 10 caracteres. Una frase corta se recuerda fácil.',
  signIn: {
    kind: 'Entrar',
    title: 'De vuelta al libro',
    submit: 'Entrar',
    forgot: '¿Olvidó la contraseña?',
    noCompany: '¿Su empresa todavía no está aquí?',
    signUp: 'Dela de alta',
  },
  demo: {
    title: (companyName) => `Conozca el programa como ${companyName}`,
    says: 'Esta instalación trae una empresa inventada. Elija una persona y oprima Entrar.',
    fill: (name, role) => `${name}, ${role}`,
  },
  signUp: {
    kind: 'Dar de alta una empresa',
    title: 'Abra un libro',
    companyName: 'Empresa',
    timeZone: 'Zona horaria',
    timeZoneHint: 'Los días y las horas de los camiones se escriben en ella.',
    name: 'Su nombre',
    submit: 'Dar de alta la empresa',
    owner: 'Usted será el dueño: invita a los demás y decide qué ve cada quien.',
    haveOne: '¿Su empresa ya está aquí?',
  },
  forgot: {
    kind: 'Contraseña',
    title: 'Reciba una nueva por correo',
    says: 'Le escribimos al correo de su cuenta con un enlace para elegir una contraseña nueva.',
    submit: 'Enviar el enlace',
    done: 'Si hay una cuenta con este correo, el enlace va en camino. Sirve una sola vez y por poco tiempo.',
    noMail: '¿No llegó nada? El dueño de su empresa puede ver el mensaje en la bandeja de salida.',
    back: 'Volver a la entrada',
  },
  reset: {
    kind: 'Contraseña',
    title: 'Elija una contraseña nueva',
    newPassword: 'Contraseña nueva',
    submit: 'Guardar y entrar',
    ends: 'Con esto se cierran sus otras sesiones.',
  },
  invite: {
    kind: 'Invitación',
    title: (companyName) => `Únase a ${companyName}`,
    says: (role) => `Le invitaron como ${role}.`,
    name: 'Su nombre',
    password: 'Elija una contraseña',
    submit: 'Unirme',
    deadTitle: 'Esta invitación ya no sirve',
    deadSays:
      'Ya se usó, se retiró o venció, o el enlace está incompleto. Pida una nueva al dueño de la empresa.',
  },
};
