import { sql } from 'drizzle-orm';
import { openStore } from '../../db/client';
import { log } from '../log';

/** Whether the server can answer: it asks the database for nothing and waits for the answer. */
export async function healthResponse(): Promise<Response> {
  const headers = { 'cache-control': 'no-store' };
  try {
    const { handle } = await openStore();
    await handle.execute(sql`select 1`);
    return Response.json({ status: 'ok' }, { headers });
  } catch (error) {
    log.error({ err: error }, 'the health check failed');
    return Response.json({ status: 'unavailable' }, { status: 503, headers });
  }
}
