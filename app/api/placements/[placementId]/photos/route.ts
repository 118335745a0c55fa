import { MAX_PHOTO_BYTES } from '@/lib/contracts/photos';
import { uploadRoute } from '@/lib/http/route';
import { uploadPhoto } from '@/lib/services/photos/upload-photo';

export const POST = uploadRoute(uploadPhoto, {
  maxBytes: MAX_PHOTO_BYTES,
  tooLarge: 'The photo is larger than 20 MB. Take it again, or send a JPEG.',
});
