import { route } from '@/lib/http/route';
import { getSheet } from '@/lib/services/statements/get-sheet';

export const GET = route(getSheet);
