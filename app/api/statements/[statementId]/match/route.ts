import { route } from '@/lib/http/route';
import { matchByHand } from '@/lib/services/statements/match-by-hand';

export const POST = route(matchByHand);
