import {
  boolean,
  date,
  foreignKey,
  index,
  integer,
  pgTable,
  text,
  unique,
  uuid,
} from 'drizzle-orm/pg-core';
import { ELEMENTS } from '../../lib/domain/elements';
import { companyRecord, quantity } from './columns';
import { companies } from './companies';
import { people } from './people';

export const jobs = pgTable(
  'jobs',
  {
    ...companyRecord(),
    number: text('number').notNull(),
    name: text('name').notNull(),
    customer: text('customer').notNull().default(''),
    address: text('address').notNull().default(''),
    status: text('status', { enum: ['open', 'finished'] })
      .notNull()
      .default('open'),
    /** False where the place of delivery or the owner is exempt from sales tax. */
    taxable: boolean('taxable').notNull().default(true),
  },
  (t) => [
    unique('jobs_company_id').on(t.companyId, t.id),
    unique('jobs_number').on(t.companyId, t.number),
    foreignKey({ columns: [t.companyId], foreignColumns: [companies.id] }),
  ],
);

/** The foremen who run a job; a foreman sees these jobs and no others unless the owner allows. */
export const jobCrew = pgTable(
  'job_crew',
  {
    ...companyRecord(),
    jobId: uuid('job_id').notNull(),
    personId: uuid('person_id').notNull(),
  },
  (t) => [
    unique('job_crew_company_id').on(t.companyId, t.id),
    unique('job_crew_once').on(t.companyId, t.jobId, t.personId),
    foreignKey({ columns: [t.companyId, t.jobId], foreignColumns: [jobs.companyId, jobs.id] }),
    foreignKey({
      columns: [t.companyId, t.personId],
      foreignColumns: [people.companyId, people.id],
    }),
  ],
);

/** One pour of one element. */
export const placements = pgTable(
  'placements',
  {
    ...companyRecord(),
    jobId: uuid('job_id').notNull(),
    name: text('name').notNull(),
    element: text('element', { enum: ELEMENTS }).notNull(),
    subgrade: text('subgrade').notNull().default(''),
    pourDate: date('pour_date').notNull(),
    firstTruckAt: integer('first_truck_at'),
    figuredYd3: quantity('figured_yd3').notNull(),
    areaFt2: quantity('area_ft2'),
    thicknessIn: quantity('thickness_in'),
    wastePercent: quantity('waste_percent').notNull().default('5'),
    status: text('status', { enum: ['planned', 'poured', 'cancelled'] })
      .notNull()
      .default('planned'),
    notes: text('notes').notNull().default(''),
  },
  (t) => [
    unique('placements_company_id').on(t.companyId, t.id),
    foreignKey({ columns: [t.companyId, t.jobId], foreignColumns: [jobs.companyId, jobs.id] }),
    index('placements_day').on(t.companyId, t.pourDate),
  ],
);
