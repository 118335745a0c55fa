import { route } from '@/lib/http/route';
import { discardImport } from '@/lib/services/imports/discard-import';
import { previewImport } from '@/lib/services/imports/preview-import';

export const GET = route(previewImport);
export const DELETE = route(discardImport);
