import { asPrinted, dashedNameDate } from '../printed-ticket';
import { beside, type TicketForm } from './form';

/** Two columns of labels with a colon beside typewritten values; 24-hour clock. */
export const halvorsenBeside: TicketForm = {
  name: 'halvorsen-beside',
  notation: { date: dashedNameDate, clock: asPrinted },
  paper: 'white',
  widthPx: 1180,
  css: `
    h1 { font: 700 48px 'Courier Prime'; margin: 0 } .sub { font: 400 24px 'Courier Prime'; margin-bottom: 24px }
    .two { display: flex; gap: 40px } .two > div { flex: 1 }
    .pair { font: 400 29px/1.75 'Courier Prime'; white-space: nowrap }
    .label { display: inline-block; width: 275px } .label::after { content: ':' } .value { font-weight: 700 }
    hr { border: 0; border-top: 3px dashed #666; margin: 22px 0 }
    .small { font: 400 20px/1.4 'Courier Prime' }`,
  html(p) {
    const t = p.ticket;
    return `
      <h1>${p.text('supplierName').toUpperCase()}</h1><div class="sub">${t.supplierAddress}</div>
      <div class="two"><div>
        ${beside('Ticket No', p.text('ticketNumber'))}${beside('Date', p.text('date'))}${beside('Order', p.text('orderNumber'))}
      </div><div>
        ${beside('Plant', p.text('plant'))}${beside('Truck', p.text('truck'))}${beside('Driver', t.driver)}
      </div></div><hr>
      ${beside('Sold to', t.customer)}${beside('Project', p.text('jobName'))}${beside('Deliver to', t.jobAddress)}${beside('Cust PO', p.text('poNumber'))}<hr>
      ${beside('Product', `${p.text('mixCode')}  ${t.mixWords}`)}
      <div class="two"><div>
        ${beside('Qty this load', `${p.text('quantityYd3')} yd`)}${beside('Qty to date', `${p.text('toDateYd3')} yd`)}${beside('Qty ordered', `${p.text('orderedYd3')} yd`)}
      </div><div>
        ${beside('Load', p.text('loadNumber'))}${beside('Slump', `${t.slumpIn} in`)}${beside('Max water', `${t.waterAllowedGal} gal`)}
      </div></div><hr>
      <div class="two"><div>
        ${beside('Batched', p.text('batchedAt'))}${beside('On site', p.text('arrivedAt'))}${beside('Start disch', p.text('startedAt'))}
      </div><div>
        ${beside('End disch', p.text('finishedAt'))}${beside('Left site', p.text('leftAt'))}${beside('Water added', p.text('waterAddedGal'))}
      </div></div><hr>
      <p class="small">WARNING - CAUSES BURNS. Avoid contact with skin and eyes. Contains cement.<br>
      Not responsible for damage inside the curb line.</p>
      <p class="small">Signed ______________________________</p>`;
  },
};
