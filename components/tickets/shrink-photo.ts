const LONGEST_SIDE_PX = 2000;
const JPEG_QUALITY = 0.8;

/**
 * A photo small enough for a site's connection and large enough to read: upright, its longest
 * side at most 2000 px, JPEG. What the browser can't open goes as it is: the server says why not.
 */
export async function shrinkPhoto(file: Blob): Promise<Blob> {
  const bitmap = await createImageBitmap(file, { imageOrientation: 'from-image' }).catch(
    () => null,
  );
  if (!bitmap) return file;
  const scale = Math.min(1, LONGEST_SIDE_PX / Math.max(bitmap.width, bitmap.height));
  const canvas = document.createElement('canvas');
  canvas.width = Math.round(bitmap.width * scale);
  canvas.height = Math.round(bitmap.height * scale);
  const pen = canvas.getContext('2d');
  if (!pen) return file;
  pen.imageSmoothingQuality = 'high';
  pen.drawImage(bitmap, 0, 0, canvas.width, canvas.height);
  bitmap.close();
  const shrunk = await new Promise<Blob | null>((done) => {
    canvas.toBlob(done, 'image/jpeg', JPEG_QUALITY);
  });
  return shrunk ?? file;
}
