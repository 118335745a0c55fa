import Decimal from 'decimal.js';
import { type Clock, dayIn } from '../../lib/clock';
import type { CompanyId } from '../../lib/domain/ids';
import { quantityText } from '../../lib/domain/money/money';
import { parseClock } from '../../lib/domain/time/clock-minutes';
import { newId } from '../../lib/ids';
import type { Handle } from '../client';
import { activity } from '../schema/activity';
import { companies } from '../schema/companies';
import { jobCrew, jobs, placements } from '../schema/jobs';
import { orderLines, orders } from '../schema/orders';
import { people } from '../schema/people';
import { rateClauses, rateSheets, suppliers } from '../schema/suppliers';
import { pumpTickets, tickets } from '../schema/tickets';
import { COMPANY, JOBS, PEOPLE, POURS, type StoryPour, SUPPLIERS, TODAYS_POUR } from './story';
import { storyFacts, ticketsOf } from './story-records';

/** The database's ids for the story's keys. */
export interface DemoIds {
  readonly companyId: CompanyId;
  readonly people: ReadonlyMap<string, string>;
  readonly suppliers: ReadonlyMap<string, string>;
  readonly jobs: ReadonlyMap<string, string>;
  /** By order number: one order a pour. */
  readonly placements: ReadonlyMap<string, string>;
  readonly orders: ReadonlyMap<string, string>;
  /** By "supplier:serial". */
  readonly tickets: ReadonlyMap<string, string>;
}

function idsFor(keys: Iterable<string>): Map<string, string> {
  return new Map([...keys].map((key) => [key, newId()]));
}

/** Which id stands for a key; the story naming an unknown key is a bug in the story. */
export function idOf(ids: ReadonlyMap<string, string>, key: string): string {
  const id = ids.get(key);
  if (!id) throw new Error(`The story names ${key}, which it never introduces`);
  return id;
}

export function demoIds(): DemoIds {
  const orderNumbers = [...POURS.map((pour) => pour.orderNumber), TODAYS_POUR.orderNumber];
  return {
    companyId: newId<'company'>(),
    people: idsFor(PEOPLE.map((one) => one.key)),
    suppliers: idsFor(SUPPLIERS.map((one) => one.key)),
    jobs: idsFor(JOBS.map((one) => one.key)),
    placements: idsFor(orderNumbers),
    orders: idsFor(orderNumbers),
    tickets: idsFor(storyFacts().tickets.map((one) => one.id)),
  };
}

/** Writes the story up to its bills, in the caller's transaction. */
export async function insertDemoRecords(
  handle: Handle,
  ids: DemoIds,
  passwordHash: string,
  clock: Clock,
): Promise<void> {
  await insertCompany(handle, ids, passwordHash);
  await insertSuppliers(handle, ids, clock);
  await insertJobs(handle, ids);
  for (const pour of POURS) await insertPour(handle, ids, pour);
  await insertTodaysPour(handle, ids, dayIn(COMPANY.timeZone, clock.now()));
  await handle.insert(activity).values({
    id: newId(),
    companyId: ids.companyId,
    at: clock.now(),
    actorName: 'Strikeoff',
    action: 'demo.load',
    entity: 'company',
    entityId: ids.companyId,
    summary: 'Loaded the demo company',
  });
}

async function insertCompany(handle: Handle, ids: DemoIds, passwordHash: string): Promise<void> {
  await handle
    .insert(companies)
    .values({ id: ids.companyId, name: COMPANY.name, timeZone: COMPANY.timeZone, isDemo: true });
  await handle.insert(people).values(
    PEOPLE.map(({ key, name, email, role }) => ({
      companyId: ids.companyId,
      id: idOf(ids.people, key),
      name,
      email,
      role,
      passwordHash,
    })),
  );
}

async function insertSuppliers(handle: Handle, ids: DemoIds, clock: Clock): Promise<void> {
  for (const { key, sheets, ...supplier } of SUPPLIERS) {
    const supplierId = idOf(ids.suppliers, key);
    await handle
      .insert(suppliers)
      .values({ ...supplier, companyId: ids.companyId, id: supplierId });
    for (const sheet of sheets) {
      const rateSheetId = newId();
      await handle.insert(rateSheets).values({
        companyId: ids.companyId,
        id: rateSheetId,
        supplierId,
        name: sheet.name,
        version: sheet.version,
        status: 'approved',
        effectiveFrom: sheet.from,
        effectiveTo: sheet.to,
        approvedBy: idOf(ids.people, 'owner'),
        approvedAt: clock.now(),
      });
      await handle.insert(rateClauses).values(
        sheet.clauses.map((clause, position) => ({
          companyId: ids.companyId,
          id: newId(),
          rateSheetId,
          position,
          clause,
        })),
      );
    }
  }
}

async function insertJobs(handle: Handle, ids: DemoIds): Promise<void> {
  for (const { key, crew, ...job } of JOBS) {
    await handle.insert(jobs).values({ ...job, companyId: ids.companyId, id: idOf(ids.jobs, key) });
    await handle.insert(jobCrew).values(
      crew.map((person) => ({
        companyId: ids.companyId,
        id: newId(),
        jobId: idOf(ids.jobs, key),
        personId: idOf(ids.people, person),
      })),
    );
  }
}

async function insertPour(handle: Handle, ids: DemoIds, pour: StoryPour): Promise<void> {
  const shared = { companyId: ids.companyId, jobId: idOf(ids.jobs, pour.job) };
  const placementId = idOf(ids.placements, pour.orderNumber);
  const orderId = idOf(ids.orders, pour.orderNumber);
  const firstTruckAt = (parseClock(pour.firstBatch) ?? 0) + 25;
  await handle.insert(placements).values({
    ...shared,
    id: placementId,
    name: pour.name,
    element: pour.element,
    subgrade: pour.subgrade,
    pourDate: pour.date,
    firstTruckAt,
    figuredYd3: pour.figuredYd3,
    areaFt2: pour.areaFt2,
    thicknessIn: pour.thicknessIn,
    status: 'poured',
  });
  await handle.insert(orders).values({
    ...shared,
    id: orderId,
    number: pour.orderNumber,
    supplierId: idOf(ids.suppliers, pour.supplier),
    placementId,
    status: 'confirmed',
    pourDate: pour.date,
    firstTruckAt,
    spacingMinutes: pour.spacing || null,
  });
  await handle.insert(orderLines).values({
    companyId: ids.companyId,
    id: newId(),
    orderId,
    position: 0,
    code: pour.mix,
    quantity: pour.orderedYd3,
    unit: 'yd³',
  });
  let toDate = new Decimal(0);
  await handle.insert(tickets).values(
    ticketsOf(pour).map(({ id, supplierId, quantityYd3, jobName: _jobName, ...ticket }) => {
      toDate = toDate.plus(quantityYd3);
      return {
        ...ticket,
        ...shared,
        id: idOf(ids.tickets, id),
        supplierId: idOf(ids.suppliers, supplierId),
        placementId,
        orderId,
        status: 'confirmed' as const,
        quantityYd3: quantityText(quantityYd3),
        orderedYd3: pour.orderedYd3,
        toDateYd3: quantityText(toDate),
        returnedYd3: null,
        clientId: newId(),
        confirmedBy: idOf(ids.people, JOBS.find((job) => job.key === pour.job)?.crew[0] ?? ''),
      };
    }),
  );
  await insertPump(handle, ids, pour, placementId);
}

async function insertPump(
  handle: Handle,
  ids: DemoIds,
  pour: StoryPour,
  placementId: string,
): Promise<void> {
  if (!pour.pump) return;
  const pump = storyFacts().pumpTickets.find((one) => one.number === pour.pump?.number);
  if (!pump) throw new Error(`Pump ticket ${pour.pump.number} is missing`);
  await handle.insert(pumpTickets).values({
    companyId: ids.companyId,
    id: newId(),
    jobId: idOf(ids.jobs, pour.job),
    supplierId: idOf(ids.suppliers, pump.supplierId),
    placementId,
    number: pump.number,
    date: pump.date,
    leftYardAt: pump.leftYardAt,
    arrivedAt: pump.arrivedAt,
    finishedAt: pump.finishedAt,
    leftAt: pump.leftAt,
    backInYardAt: pump.backInYardAt,
    pumpedYd3: quantityText(pump.pumpedYd3),
    setUps: pump.setUps,
  });
}

async function insertTodaysPour(handle: Handle, ids: DemoIds, today: string): Promise<void> {
  const pour = TODAYS_POUR;
  const shared = { companyId: ids.companyId, jobId: idOf(ids.jobs, pour.job) };
  const placementId = idOf(ids.placements, pour.orderNumber);
  const orderId = idOf(ids.orders, pour.orderNumber);
  const firstTruckAt = parseClock(pour.firstTruck);
  await handle.insert(placements).values({
    ...shared,
    id: placementId,
    name: pour.name,
    element: pour.element,
    subgrade: pour.subgrade,
    pourDate: today,
    firstTruckAt,
    figuredYd3: pour.figuredYd3,
    areaFt2: pour.areaFt2,
    thicknessIn: pour.thicknessIn,
  });
  await handle.insert(orders).values({
    ...shared,
    id: orderId,
    number: pour.orderNumber,
    supplierId: idOf(ids.suppliers, pour.supplier),
    placementId,
    status: 'confirmed',
    pourDate: today,
    firstTruckAt,
    spacingMinutes: pour.spacing,
  });
  await handle.insert(orderLines).values({
    companyId: ids.companyId,
    id: newId(),
    orderId,
    position: 0,
    code: pour.mix,
    quantity: pour.orderedYd3,
    unit: 'yd³',
  });
}
