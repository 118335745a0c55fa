import { z } from 'zod';
import { name, uuid } from './common';

export const keyRow = z.object({
  id: uuid,
  name: z.string(),
  /** Enough to tell two keys apart; the key itself is stored nowhere. */
  lastFour: z.string(),
  issuedBy: z.string(),
  issuedAt: z.iso.datetime(),
  lastUsedAt: z.iso.datetime().nullable(),
  revokedAt: z.iso.datetime().nullable(),
});
export type KeyRow = z.infer<typeof keyRow>;

export const listKeysInput = z.strictObject({});
export const listKeysOutput = z.object({ rows: z.array(keyRow) });

export const issueKeyInput = z.strictObject({ name });
export const issueKeyOutput = z.object({
  /** Shown this once. */
  key: z.string(),
  row: keyRow,
});

export const revokeKeyInput = z.strictObject({ keyId: uuid });
