/**
 * Turns an SVG into a PNG.
 * @param size in pixels of the page; the PNG has `scale` times as many
 * @returns base64 text without a prefix, as the host takes it
 */
export async function rasterise(
  svg: string,
  { width, height }: { readonly width: number; readonly height: number },
  scale = 3,
): Promise<string> {
  const image = new Image();
  image.width = width * scale;
  image.height = height * scale;
  const loaded = new Promise<void>((resolve, reject) => {
    image.onload = () => resolve();
    image.onerror = () => reject(new Error('the picture cannot be drawn'));
  });
  // A data address keeps within the page's own content rules.
  image.src = `data:image/svg+xml;charset=utf-8,${encodeURIComponent(svg)}`;
  await loaded;
  const canvas = document.createElement('canvas');
  canvas.width = width * scale;
  canvas.height = height * scale;
  const drawing = canvas.getContext('2d');
  if (drawing === null) throw new Error('the picture cannot be drawn');
  drawing.fillStyle = '#ffffff';
  drawing.fillRect(0, 0, canvas.width, canvas.height);
  drawing.drawImage(image, 0, 0, canvas.width, canvas.height);
  return canvas.toDataURL('image/png').replace(/^data:image\/png;base64,/, '');
}
