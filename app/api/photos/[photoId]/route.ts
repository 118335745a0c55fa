import { fileRoute } from '@/lib/http/route';
import { getPhoto } from '@/lib/services/photos/get-photo';

export const GET = fileRoute(getPhoto);
