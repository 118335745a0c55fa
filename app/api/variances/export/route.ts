import { fileRoute } from '@/lib/http/route';
import { exportVariances } from '@/lib/services/variances/export-variances';

export const GET = fileRoute(exportVariances);
