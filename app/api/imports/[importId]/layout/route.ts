import { route } from '@/lib/http/route';
import { setImportLayout } from '@/lib/services/imports/set-import-layout';

export const PUT = route(setImportLayout);
