import { namedDate, terseHalfDayClock } from '../printed-ticket';
import { box, type TicketForm } from './form';

/** A dot printer's text dropped into a pre-printed pink copy, labels above; 12-hour clock. */
export const halvorsenDots: TicketForm = {
  name: 'halvorsen-dots',
  notation: { date: namedDate, clock: terseHalfDayClock },
  paper: 'pink',
  widthPx: 1200,
  css: `
    .head { display: flex; justify-content: space-between; border-bottom: 4px solid #7a4450; padding-bottom: 14px }
    h1 { font: 800 46px 'Public Sans'; margin: 0; color: #6d3541 } .sub { font: 500 20px 'Public Sans'; color: #6d3541 }
    .grid { display: grid; grid-template-columns: repeat(4, 1fr) }
    .box { border-bottom: 2px solid #b98590; padding: 10px 8px 8px }
    .label { display: block; font: 500 18px 'Public Sans'; color: #6d3541 }
    .value { display: block; font: 400 44px/44px VT323; min-height: 44px; color: #26263a; padding-left: 6px }
    .small { font: 400 18px/1.4 'Public Sans'; color: #6d3541 }`,
  html(p) {
    const t = p.ticket;
    const wide = 'grid-column: span 2';
    return `
      <div class="head"><div><h1>${p.text('supplierName')}</h1><div class="sub">${t.supplierAddress}</div></div>
        <div class="box" style="border:0"><span class="label">Delivery ticket</span><span class="value" style="font-size:56px">${p.text('ticketNumber')}</span></div></div>
      <div class="grid">
        ${box('Date', p.text('date'), wide)}${box('Plant no.', p.text('plant'))}${box('Truck no.', p.text('truck'))}
        ${box('Customer', t.customer, wide)}${box('Job name', p.text('jobName'), wide)}
        ${box('Ship to', t.jobAddress, wide)}${box('Purchase order', p.text('poNumber'))}${box('Order number', p.text('orderNumber'))}
        ${box('Mix design', p.text('mixCode'))}${box('Mix description', t.mixWords, wide)}${box('Load number', p.text('loadNumber'))}
        ${box('Cubic yards', p.text('quantityYd3'))}${box('Cumulative', p.text('toDateYd3'))}${box('Total ordered', p.text('orderedYd3'))}${box('Slump', t.slumpIn)}
        ${box('Load time', p.text('batchedAt'))}${box('Arrived job', p.text('arrivedAt'))}${box('Begin unloading', p.text('startedAt'))}${box('End unloading', p.text('finishedAt'))}
        ${box('Leave job', p.text('leftAt'))}${box('Gallons added', p.text('waterAddedGal'))}${box('Authorized by', '', wide)}
      </div>
      <p class="small">Pink: customer's copy. Fresh concrete may cause burns; wear boots and gloves, and rinse skin at once.</p>`;
  },
};
