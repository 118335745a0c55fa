import { route } from '@/lib/http/route';
import { listDemoFiles } from '@/lib/services/demo/list-demo-files';

export const GET = route(listDemoFiles);
