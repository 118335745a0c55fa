import type { HomeMessages } from '../en/home';

/** Las palabras de la página que se ve antes de entrar. */
export const home: HomeMessages = {
  kind: 'Para contratistas de losas y pisos de concreto',
  title: 'Pedido, entregado, cobrado: tache\u00a0lo\u00a0que coincide.',
  says: 'El pedido fue una llamada. La entrega es una boleta de papel en manos de un capataz con guantes mojados. El cobro es un estado de cuenta de cientos de renglones a fin de mes. Strikeoff pone los tres lado a lado, calcula lo que cada proveedor debe cobrar y muestra lo que no coincide, al centavo y antes de la fecha del descuento.',
  signIn: 'Entrar',
  signUp: 'Dar de alta una empresa',
  exampleTitle: 'Un camión en tres copias',
  exampleSays: 'Una carga inventada. La línea que la cruza es el tache: esta parte coincide.',
  job: 'Obra',
  mix: 'Mezcla',
  load: 'Carga',
  onSite: 'En obra',
  waiting: 'Espera',
  ticket: 'Boleta',
  line: 'Renglón',
  concrete: 'Concreto',
  waitingAgreed: '5 min libres por yarda',
  finding: 'Espera que no se debe',
  findingSays: '46 minutos en obra, 50 minutos libres por 10 yardas: no se debe nada.',
  peopleTitle: 'Quién lo usa',
  people: [
    {
      who: 'Capataz',
      what: 'Fotografía cada boleta entre dos camiones y ve las yardas que van contra el pedido. La foto nunca se pierde, con señal o sin ella. Sin precios, salvo que el dueño lo decida.',
    },
    {
      who: 'Contabilidad',
      what: 'Trae el estado de cuenta tal como lo manda el proveedor, tacha con el teclado lo que coincide y devuelve lo que no, con su boleta y su cálculo.',
    },
    {
      who: 'Dueño',
      what: 'Ve qué colados se pasaron y por qué, cuánto cuesta cada proveedor con todo incluido y cuánto dinero queda pendiente con cada uno.',
    },
  ],
};
