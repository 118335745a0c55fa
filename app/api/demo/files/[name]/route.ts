import { fileRoute } from '@/lib/http/route';
import { getDemoFile } from '@/lib/services/demo/get-demo-file';

export const GET = fileRoute(getDemoFile);
