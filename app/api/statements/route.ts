import { route } from '@/lib/http/route';
import { listStatements } from '@/lib/services/statements/list-statements';

export const GET = route(listStatements);
