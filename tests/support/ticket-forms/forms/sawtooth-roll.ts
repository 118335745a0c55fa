import { asPrinted } from '../printed-ticket';
import { beside, type TicketForm } from './form';

/** A narrow roll from the truck's own printer, labels beside without a colon; ISO dates. */
export const sawtoothRoll: TicketForm = {
  name: 'sawtooth-roll',
  notation: { date: asPrinted, clock: asPrinted },
  paper: 'white',
  widthPx: 860,
  css: `
    h1 { font: 700 46px 'Sometype Mono'; margin: 0; text-align: center } .sub { font: 400 22px 'Sometype Mono'; text-align: center; margin-bottom: 22px }
    .pair { display: flex; justify-content: space-between; font: 500 31px/1.55 'Sometype Mono' }
    hr { border: 0; border-top: 2px solid #555; margin: 14px 0 }
    .small { font: 400 19px/1.4 'Sometype Mono'; text-align: center }`,
  html(p) {
    const t = p.ticket;
    return `
      <h1>${p.text('supplierName')}</h1><div class="sub">${t.supplierAddress}</div>
      ${beside('TICKET #', p.text('ticketNumber'))}${beside('DATE', p.text('date'))}${beside('PLANT', p.text('plant'))}${beside('TRUCK', p.text('truck'))}<hr>
      ${beside('CUSTOMER', t.customer)}${beside('JOB', p.text('jobName'))}${beside('ORDER #', p.text('orderNumber'))}<hr>
      ${beside('MIX', p.text('mixCode'))}${beside('LOAD #', p.text('loadNumber'))}
      ${beside('YARDS THIS LOAD', p.text('quantityYd3'))}${beside('YARDS SO FAR', p.text('toDateYd3'))}${beside('YARDS ORDERED', p.text('orderedYd3'))}<hr>
      ${beside('BATCH TIME', p.text('batchedAt'))}${beside('ARRIVED', p.text('arrivedAt'))}${beside('POUR START', p.text('startedAt'))}${beside('POUR END', p.text('finishedAt'))}${beside('DEPARTED', p.text('leftAt'))}<hr>
      ${beside('WATER ADDED GAL', p.text('waterAddedGal'))}
      <p class="small">Contains cement. Wash skin at once.<br>Thank you.</p>`;
  },
};
