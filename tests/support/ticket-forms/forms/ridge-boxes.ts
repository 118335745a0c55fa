import { asPrinted, slashedDate } from '../printed-ticket';
import { box, type TicketForm } from './form';

/** Ruled boxes with small labels above typewritten values; 24-hour clock. */
export const ridgeBoxes: TicketForm = {
  name: 'ridge-boxes',
  notation: { date: slashedDate, clock: asPrinted },
  paper: 'white',
  widthPx: 1200,
  css: `
    .head { display: flex; justify-content: space-between; align-items: flex-end; margin-bottom: 26px }
    h1 { font: 800 50px Besley; margin: 0 }
    .sub { font: 500 21px 'Public Sans' }
    .number { text-align: right } .number .value { font-size: 46px }
    .row { display: flex; border: 2px solid #444; border-bottom: 0 } .row + .small { border-top: 2px solid #444; padding-top: 22px }
    .box { flex: 1; border-right: 2px solid #444; padding: 8px 12px 12px } .box:last-child { border-right: 0 }
    .label { display: block; font: 600 17px 'Public Sans'; letter-spacing: .5px; color: #333 }
    .value { display: block; font: 700 33px 'Courier Prime'; min-height: 38px }
    .small { font: 400 17px/1.4 'Public Sans'; margin-top: 0 }
    .sign { margin-top: 70px; border-top: 2px solid #444; font: 500 18px 'Public Sans'; width: 60% }`,
  html(p) {
    const t = p.ticket;
    const row = (...boxes: string[]) => `<div class="row">${boxes.join('')}</div>`;
    return `
      <div class="head">
        <div><h1>${p.text('supplierName')}</h1><div class="sub">${t.supplierAddress}</div></div>
        <div class="number"><span class="label">TICKET NO.</span><span class="value">${p.text('ticketNumber')}</span></div>
      </div>
      ${row(box('DATE', p.text('date')), box('PLANT', p.text('plant')), box('TRUCK', p.text('truck')), box('DRIVER', t.driver))}
      ${row(box('SOLD TO', t.customer), box('JOB', p.text('jobName')))}
      ${row(box('DELIVERY ADDRESS', t.jobAddress, 'flex:2'), box('P.O. NUMBER', p.text('poNumber')), box('ORDER NO.', p.text('orderNumber')))}
      ${row(box('MIX', p.text('mixCode')), box('DESCRIPTION', t.mixWords, 'flex:2'), box('SLUMP', t.slumpIn))}
      ${row(box('THIS LOAD YDS', p.text('quantityYd3')), box('DELIVERED TO DATE', p.text('toDateYd3')), box('ORDERED YDS', p.text('orderedYd3')), box('LOAD NO.', p.text('loadNumber')))}
      ${row(box('BATCHED', p.text('batchedAt')), box('ARRIVE JOB', p.text('arrivedAt')), box('START UNLOAD', p.text('startedAt')), box('FINISH UNLOAD', p.text('finishedAt')), box('LEAVE JOB', p.text('leftAt')))}
      ${row(box('WATER ALLOWED GAL', t.waterAllowedGal), box('WATER ADDED GAL', p.text('waterAddedGal')), box('ADDED BY', ''))}
      <p class="small">CAUTION: fresh concrete burns skin and eyes. Wear boots and gloves. Wash at once with water.
      Our drivers cross the curb line at the customer's risk. Water added on the job lowers strength.</p>
      <div class="sign">RECEIVED BY</div>`;
  },
};
