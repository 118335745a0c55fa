import { fileRoute } from '@/lib/http/route';
import { exportYield } from '@/lib/services/yield/export-yield';

export const GET = fileRoute(exportYield);
