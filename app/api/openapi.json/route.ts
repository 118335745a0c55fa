import { readEnv } from '@/lib/env';
import { describeApi } from '@/lib/http/openapi';
import { PUBLIC_REGISTRY } from '@/lib/services/public-registry';
import { REGISTRY } from '@/lib/services/registry';

export const dynamic = 'force-dynamic';

export function GET(): Response {
  return Response.json(describeApi(REGISTRY, PUBLIC_REGISTRY, readEnv().appOrigin));
}
