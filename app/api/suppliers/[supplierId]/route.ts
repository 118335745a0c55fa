import { route } from '@/lib/http/route';
import { getSupplier } from '@/lib/services/suppliers/get-supplier';
import { updateSupplier } from '@/lib/services/suppliers/update-supplier';

export const GET = route(getSupplier);
export const PUT = route(updateSupplier);
