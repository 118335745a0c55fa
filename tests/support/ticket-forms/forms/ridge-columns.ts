import { halfDayClock, shortDate } from '../printed-ticket';
import { columns, type TicketForm } from './form';

/** Ruled tables under column headings on the canary copy; 12-hour clock. */
export const ridgeColumns: TicketForm = {
  name: 'ridge-columns',
  notation: { date: shortDate, clock: halfDayClock },
  paper: 'canary',
  widthPx: 1200,
  css: `
    h1 { font: 800 44px Besley; margin: 0; text-align: center }
    .sub { font: 500 20px 'Public Sans'; text-align: center; margin-bottom: 20px }
    table { border-collapse: collapse; width: 100%; margin-bottom: 22px }
    th, td { border: 2px solid #555; padding: 6px 10px; text-align: center }
    th { font: 600 18px 'Public Sans'; background: rgba(0,0,0,.07) } td { font: 500 34px 'Sometype Mono'; height: 46px }
    .party { font: 500 30px/1.5 'Sometype Mono' } .party b { font: 600 19px 'Public Sans'; display: inline-block; width: 190px }
    .weights td { font-size: 24px; height: 30px } .weights th { font-size: 16px }
    .small { font: 400 17px/1.4 'Public Sans' }`,
  html(p) {
    const t = p.ticket;
    return `
      <h1>${p.text('supplierName')}</h1><div class="sub">${t.supplierAddress}</div>
      ${columns(p, [
        ['TICKET', 'ticketNumber'],
        ['DATE', 'date'],
        ['PLANT', 'plant'],
        ['TRUCK NO', 'truck'],
        ['LOAD #', 'loadNumber'],
      ])}
      <div class="party"><b>CUSTOMER</b>${t.customer}<br><b>JOB NAME</b>${p.text('jobName')}<br><b>ADDRESS</b>${t.jobAddress}</div><br>
      ${columns(p, [
        ['ORDER NO', 'orderNumber'],
        ['PO NO', 'poNumber'],
        ['MIX CODE', 'mixCode'],
        ['WATER ADDED', 'waterAddedGal'],
      ])}
      ${columns(p, [
        ['LOAD QTY', 'quantityYd3'],
        ['TOTAL DELIVERED', 'toDateYd3'],
        ['ORDER QTY', 'orderedYd3'],
      ])}
      ${columns(p, [
        ['TIME LOADED', 'batchedAt'],
        ['ON JOB', 'arrivedAt'],
        ['BEGIN POUR', 'startedAt'],
        ['END POUR', 'finishedAt'],
      ])}
      <table class="weights"><tr><th>MATERIAL</th><th>REQUIRED</th><th>BATCHED</th><th>UNIT</th></tr>
        <tr><td>STONE</td><td>17850</td><td>17900</td><td>LB</td></tr>
        <tr><td>SAND</td><td>13420</td><td>13380</td><td>LB</td></tr>
        <tr><td>CEMENT</td><td>5640</td><td>5655</td><td>LB</td></tr>
        <tr><td>WATER</td><td>262.0</td><td>260.5</td><td>GAL</td></tr></table>
      <p class="small">Driver: ${t.driver}. Concrete is sold by volume as batched. Keep skin dry; wash off at once.</p>`;
  },
};
