import { NotchworkError } from '../../src/errors.ts';

/**
 * Draws an SVG text into a PNG.
 *
 * @param scale pixels for each unit of the SVG.
 * @throws NotchworkError `storage-failed` where the browser cannot make the picture.
 */
export async function rasterise(svgText: string, scale: number): Promise<Blob> {
  const url = URL.createObjectURL(new Blob([svgText], { type: 'image/svg+xml' }));
  try {
    const image = new Image();
    image.src = url;
    await image.decode();
    const canvas = document.createElement('canvas');
    canvas.width = image.naturalWidth * scale;
    canvas.height = image.naturalHeight * scale;
    canvas.getContext('2d')?.drawImage(image, 0, 0, canvas.width, canvas.height);
    const blob = await new Promise<Blob | null>((resolve) => canvas.toBlob(resolve, 'image/png'));
    if (blob === null)
      throw new NotchworkError(
        'storage-failed',
        'This browser could not make the picture; save the SVG instead.',
      );
    return blob;
  } finally {
    URL.revokeObjectURL(url);
  }
}
