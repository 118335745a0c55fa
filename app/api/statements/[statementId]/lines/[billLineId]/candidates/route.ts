import { route } from '@/lib/http/route';
import { matchCandidates } from '@/lib/services/statements/match-candidates';

export const GET = route(matchCandidates);
