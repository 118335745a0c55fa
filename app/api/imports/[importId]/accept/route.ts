import { route } from '@/lib/http/route';
import { acceptImport } from '@/lib/services/imports/accept-import';

export const POST = route(acceptImport);
