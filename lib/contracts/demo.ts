import { z } from 'zod';

/** What the demo company can be tried with: the open month's statements, and today's tickets. */
export const DEMO_FILES = [
  { name: 'cinder-ridge-2026-11.csv', kind: 'statement', of: 'Cinder Ridge Ready-Mix' },
  { name: 'halvorsen-2026-11.csv', kind: 'statement', of: 'Halvorsen Concrete' },
  { name: 'longreach-2026-11.csv', kind: 'statement', of: 'Longreach Pumping' },
  { name: 'tri-county-2026-11.csv', kind: 'statement', of: 'Tri-County Pump' },
  { name: '558901.jpg', kind: 'ticket', of: 'Cinder Ridge Ready-Mix' },
  { name: '558902.jpg', kind: 'ticket', of: 'Cinder Ridge Ready-Mix' },
  { name: '558903.jpg', kind: 'ticket', of: 'Cinder Ridge Ready-Mix' },
  { name: '558904.jpg', kind: 'ticket', of: 'Cinder Ridge Ready-Mix' },
] as const;

export const demoFile = z.object({
  name: z.string(),
  kind: z.enum(['statement', 'ticket']),
  /** The supplier whose paper it is. */
  of: z.string(),
});
export type DemoFile = z.infer<typeof demoFile>;

export const listDemoFilesInput = z.strictObject({});
export const listDemoFilesOutput = z.object({ rows: z.array(demoFile) });
export const getDemoFileInput = z.strictObject({ name: z.string().max(80) });
