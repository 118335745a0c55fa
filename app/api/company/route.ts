import { route } from '@/lib/http/route';
import { getCompany } from '@/lib/services/company/get-company';
import { updateCompany } from '@/lib/services/company/update-company';

export const GET = route(getCompany);
export const PUT = route(updateCompany);
