import { fileRoute } from '@/lib/http/route';
import { exportStatements } from '@/lib/services/statements/export-statements';

export const GET = fileRoute(exportStatements);
