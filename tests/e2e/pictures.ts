import sharp from 'sharp'

/** A photo as a phone takes it: upright by its own mark only, and with the place in it. */
export async function drawRing(): Promise<{ name: string; mimeType: string; buffer: Buffer }> {
  const ring = `<svg xmlns="http://www.w3.org/2000/svg" width="1600" height="1200"><rect width="1600" height="1200" fill="#8d9287"/><circle cx="800" cy="600" r="300" fill="none" stroke="#c9cdcc" stroke-width="90"/><path d="M720 850a90 70 0 0 1 160 0z" fill="#3c4042"/></svg>`
  const buffer = await sharp(Buffer.from(ring))
    .withExif({
      IFD0: { Make: 'Invented' },
      IFD3: {
        GPSLatitudeRef: 'N',
        GPSLatitude: '33/1 22/1 36/1',
        GPSLongitudeRef: 'W',
        GPSLongitude: '28/1 36/1 23/1',
      },
    })
    .jpeg()
    .toBuffer()
  return { name: 'ring.jpg', mimeType: 'image/jpeg', buffer }
}
