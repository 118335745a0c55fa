import { healthResponse } from '@/lib/http/health';

export const dynamic = 'force-dynamic';
export const GET = healthResponse;
