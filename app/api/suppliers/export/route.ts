import { fileRoute } from '@/lib/http/route';
import { exportSuppliers } from '@/lib/services/suppliers/export-suppliers';

export const GET = fileRoute(exportSuppliers);
