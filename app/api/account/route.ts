import { route } from '@/lib/http/route';
import { getAccount } from '@/lib/services/account/get-account';
import { updateAccount } from '@/lib/services/account/update-account';

export const GET = route(getAccount);
export const PUT = route(updateAccount);
