import { route } from '@/lib/http/route';
import { issueKey } from '@/lib/services/keys/issue-key';
import { listKeys } from '@/lib/services/keys/list-keys';

export const GET = route(listKeys);
export const POST = route(issueKey);
