import { route } from '@/lib/http/route';
import { createSupplier } from '@/lib/services/suppliers/create-supplier';
import { listSuppliers } from '@/lib/services/suppliers/list-suppliers';

export const GET = route(listSuppliers);
export const POST = route(createSupplier);
