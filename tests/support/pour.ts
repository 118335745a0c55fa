import { randomUUID } from 'node:crypto';
import sharp from 'sharp';
import type { Store } from '../../db/client';
import { jobCrew, jobs, placements } from '../../db/schema/jobs';
import { orderLines, orders } from '../../db/schema/orders';
import { suppliers } from '../../db/schema/suppliers';
import { newId } from '../../lib/ids';
import type { TestCompany } from './company';

export interface TestPour {
  readonly jobId: string;
  readonly placementId: string;
  readonly supplierId: string;
  readonly pumpSupplierId: string;
  readonly orderId: string;
}

/** A job with its foreman, one placement of 60 yards ordered from one supplier, and a pump. */
export async function testPour(
  store: Store,
  company: TestCompany,
  pourDate = '2026-09-03',
): Promise<TestPour> {
  const { companyId } = company;
  const pour = {
    jobId: newId<'job'>(),
    placementId: newId<'placement'>(),
    supplierId: newId<'supplier'>(),
    pumpSupplierId: newId<'supplier'>(),
    orderId: newId<'order'>(),
  };
  const { handle } = store;
  const number = pour.jobId.slice(0, 8);
  await handle.insert(jobs).values({ companyId, id: pour.jobId, number, name: 'Mill Race apron' });
  await handle.insert(jobCrew).values({
    companyId,
    id: newId(),
    jobId: pour.jobId,
    personId: company.foreman.personId,
  });
  await handle.insert(placements).values({
    companyId,
    id: pour.placementId,
    jobId: pour.jobId,
    name: 'Apron',
    element: 'slab',
    pourDate,
    firstTruckAt: 420,
    figuredYd3: '57.10',
  });
  await handle.insert(suppliers).values([
    { companyId, id: pour.supplierId, name: `Cinder Ridge ${number}`, kind: 'readyMix' },
    { companyId, id: pour.pumpSupplierId, name: `Longreach ${number}`, kind: 'pump' },
  ]);
  await handle.insert(orders).values({
    companyId,
    id: pour.orderId,
    number: `CR-${number}`,
    supplierId: pour.supplierId,
    jobId: pour.jobId,
    placementId: pour.placementId,
    status: 'confirmed',
    pourDate,
  });
  await handle.insert(orderLines).values({
    companyId,
    id: newId(),
    orderId: pour.orderId,
    position: 1,
    code: '4000AE',
    quantity: '60.00',
    unit: 'yd³',
  });
  return pour;
}

/** A picture that no other test sends; there is no ticket on it. */
export async function testPicture(): Promise<Uint8Array> {
  const shade = Number.parseInt(randomUUID().slice(0, 6), 16);
  const background = { r: shade >> 16, g: (shade >> 8) & 255, b: shade & 255 };
  const picture = sharp({ create: { width: 320, height: 480, channels: 3, background } });
  return new Uint8Array(await picture.png().toBuffer());
}

/** What a person confirms for a load of the pour. */
export function ticketInput(pour: TestPour, number = '558142') {
  return {
    number,
    supplierId: pour.supplierId,
    jobId: pour.jobId,
    placementId: pour.placementId,
    orderId: pour.orderId,
    date: '2026-09-03',
    mixCode: '4000AE',
    quantityYd3: '10.00',
    truck: '187',
    batchedAt: 446,
    arrivedAt: 480,
  };
}
