import { MAX_IMPORT_BYTES } from '@/lib/contracts/imports';
import { route, uploadRoute } from '@/lib/http/route';
import { listImports } from '@/lib/services/imports/list-imports';
import { uploadImport } from '@/lib/services/imports/upload-import';

export const GET = route(listImports);
export const POST = uploadRoute(uploadImport, {
  maxBytes: MAX_IMPORT_BYTES,
  tooLarge:
    'The file is larger than 10 MB, which no statement is. Choose the CSV export of one month.',
});
