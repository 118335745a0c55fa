import { fileRoute } from '@/lib/http/route';
import { exportSheet } from '@/lib/services/statements/export-sheet';

export const GET = fileRoute(exportSheet);
