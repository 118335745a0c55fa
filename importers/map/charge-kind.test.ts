import { describe, expect, it } from 'vitest';
import { readChargeKind } from './charge-kind';

const clues = {
  itemCode: null,
  unit: null,
  quantity: null,
  ticketNumber: null,
  ticketYards: null,
};

describe('readChargeKind', () => {
  it.each([
    ['4000 PSI exterior', 'CY', 'mix'],
    ['READY MIX CONCRETE', 'YD', 'mix'],
    ['6 SACK GROUT', 'CY', 'mix'],
    ['3000 PUMP MIX', 'CY', 'mix'],
    ['3500 PSI W/ FIBER', 'CY', 'mix'],
    ['Short load charge', 'EA', 'shortLoad'],
    ['SMALL LOAD FEE - CONCRETE', 'LD', 'shortLoad'],
    ['Minimum load', null, 'shortLoad'],
    ['Waiting time', 'MIN', 'waiting'],
    ['DEMURRAGE', 'MIN', 'waiting'],
    ['Standby', 'HR', 'waiting'],
    ['Truck time over allowance', 'MIN', 'waiting'],
    ['Fuel surcharge', 'LD', 'perLoadFee'],
    ['Environmental fee', 'CY', 'perYardFee'],
    ['FUEL SURCHARGE - READY MIX', 'LD', 'perLoadFee'],
    ['Winter service', 'CY', 'perYardFee'],
    ['Fiber mesh', 'CY', 'perYardFee'],
    ['Boom pump hourly', 'HR', 'pumpTime'],
    ['38M boom', 'HR', 'pumpTime'],
    ['Pump truck time', 'HR', 'pumpTime'],
    ['Pump minimum 4 hours', 'HR', 'pumpMinimum'],
    ['4 hr minimum', 'HR', 'pumpMinimum'],
    ['Yards pumped', 'CY', 'pumpYards'],
    ['Concrete pumping', 'CY', 'pumpYards'],
    ['Pump set-up', 'EA', 'pumpSetUp'],
    ['Primer', 'BAG', 'other'],
    ['Sales tax', null, 'tax'],
    ['County Tax 8.25%', null, 'tax'],
    ['Gate opener', 'EA', 'other'],
  ] as const)('%s (%s) is %s', (description, unit, kind) => {
    const reading = readChargeKind({ ...clues, description, unit });
    expect(reading.kind).toBe(kind);
    expect(reading.reason).not.toBe('');
  });

  it("takes a fee as per yard where its quantity is the load's yards", () => {
    const fee = { ...clues, description: 'Environmental', quantity: '9.50', ticketNumber: '1' };
    expect(readChargeKind({ ...fee, ticketYards: '9.5' }).kind).toBe('perYardFee');
    expect(readChargeKind({ ...fee, ticketYards: '8' }).kind).toBe('perLoadFee');
  });

  it('says that it is not sure where no word is known', () => {
    expect(readChargeKind({ ...clues, description: 'Gate opener' }).sure).toBe(false);
  });
});
