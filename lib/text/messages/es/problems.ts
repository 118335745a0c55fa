/**
 * What the contracts and the server say in English when something is wrong, said in Spanish. The
 * sentences of failures go by their code; those of fields by their wording.
 */
export const problems: {
  readonly failures: Readonly<Record<string, string>>;
  readonly issues: Readonly<Record<string, string>>;
} = {
  failures: {
    noSignal: 'Sin conexión. No se perdió nada; intente de nuevo.',
    unexpected: 'Algo falló de nuestro lado. Intente de nuevo.',
    notSignedIn: 'Ese correo y esa contraseña no coinciden, o su sesión terminó.',
    notAllowed: 'Su puesto no incluye esto.',
    notFound: 'No existe, o fue eliminado.',
    conflict: 'Esto choca con lo que ya está registrado. Ábralo otra vez y revise.',
    invalid: 'Revise los datos marcados.',
    tooLarge: 'El archivo es demasiado grande.',
    wrongType: 'Este tipo de archivo no sirve aquí.',
    tooMany: 'Demasiados intentos. Espere unos minutos.',
    closed: 'Ya está cerrado; no se puede cambiar.',
  },
  issues: {
    needed: 'falta este dato',
    'at least 10 characters': 'al menos 10 caracteres',
    'at most 256 characters': 'a lo más 256 caracteres',
    'an e-mail address such as name@company.com': 'un correo como nombre@empresa.com',
    'a time zone such as America/Chicago': 'una zona horaria como America/Chicago',
    'not a complete link': 'el enlace está incompleto',
    'a number such as 12.50': 'un número como 12.50',
    'more than was delivered': 'más de lo entregado',
    'earlier than the time before it': 'antes que la hora anterior',
    'too much for one truck': 'demasiado para un camión',
    'zero or more': 'cero o más',
    'already used by another ticket': 'ya lo tiene otra boleta',
    'already used on another job': 'ya está en otra obra',
    'already used by another pump ticket': 'ya lo tiene otra boleta de bomba',
    'more than zero': 'más que cero',
  },
};
