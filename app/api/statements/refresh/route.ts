import { route } from '@/lib/http/route';
import { refreshFindings } from '@/lib/services/statements/refresh-findings';

export const POST = route(refreshFindings);
