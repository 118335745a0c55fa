import { route } from '@/lib/http/route';
import { getReading } from '@/lib/services/photos/get-reading';

export const GET = route(getReading);
