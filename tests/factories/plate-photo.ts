import sharp from 'sharp';

type Spot = { rf: number; strength?: number };
export type DrawnPlate = {
  widthPx: number;
  heightPx: number;
  baselineY: number;
  frontY: number;
  lanes: { x: number; spots: { x: number; y: number; rf: number }[] }[];
  jpeg: Buffer;
};

type Options = {
  lanes?: { spots: Spot[] }[];
  widthPx?: number;
  heightPx?: number;
  quality?: number;
  /** EXIF orientation written beside the pixels (1 to 8). */
  orientation?: number;
  /** EXIF tags of the GPS directory, to be found nowhere in a preview. */
  gps?: boolean;
};

/** A Gauss-shaped dark spot: one standard deviation is 1.1 % of the plate's width. */
function shade(
  pixels: Uint8Array,
  widthPx: number,
  heightPx: number,
  x: number,
  y: number,
  strength: number,
) {
  const sigma = widthPx * 0.011;
  const reach = Math.ceil(4 * sigma);
  for (let row = Math.max(0, Math.floor(y - reach)); row < Math.min(heightPx, y + reach); row += 1) {
    for (
      let column = Math.max(0, Math.floor(x - reach));
      column < Math.min(widthPx, x + reach);
      column += 1
    ) {
      const dark = strength * Math.exp(-((column - x) ** 2 + (row - y) ** 2) / (2 * sigma * sigma));
      const at = (row * widthPx + column) * 3;
      for (let channel = 0; channel < 3; channel += 1) pixels[at + channel]! *= 1 - dark;
    }
  }
}

function line(pixels: Uint8Array, widthPx: number, y: number) {
  for (let thick = -1; thick <= 1; thick += 1)
    for (let x = 0; x < widthPx; x += 1)
      pixels.fill(110, ((y + thick) * widthPx + x) * 3, ((y + thick) * widthPx + x) * 3 + 3);
}

/**
 * Draws a plate seen from straight above, with pencilled baseline and front and spots at known Rf. Pixel by pixel,
 * since the app switches off the decoder for drawings in its process.
 */
export async function drawPlatePhoto(options: Options = {}): Promise<DrawnPlate> {
  const { widthPx = 600, heightPx = 900, quality = 88, orientation, gps } = options;
  const lanes = options.lanes ?? [
    { spots: [{ rf: 0.44 }] },
    { spots: [{ rf: 0.44 }, { rf: 0.71, strength: 0.3 }] },
  ];
  const pixels = new Uint8Array(widthPx * heightPx * 3);
  for (let at = 0; at < pixels.length; at += 3) {
    // The green glow of a fluorescent layer under UV, a little uneven.
    const uneven = 1 - (0.06 * ((at / 3) % widthPx)) / widthPx;
    pixels.set([88 * uneven, 196 * uneven, 120 * uneven], at);
  }
  const baselineY = Math.round(heightPx * 0.87);
  const frontY = Math.round(heightPx * 0.09);
  line(pixels, widthPx, baselineY);
  line(pixels, widthPx, frontY);
  const drawn = lanes.map((lane, index) => {
    const x = (widthPx * (index + 1)) / (lanes.length + 1);
    const spots = lane.spots.map(({ rf, strength = 0.75 }) => {
      const y = baselineY - rf * (baselineY - frontY);
      shade(pixels, widthPx, heightPx, x, y, strength);
      return { x, y, rf };
    });
    return { x, spots };
  });
  let picture = sharp(pixels, { raw: { width: widthPx, height: heightPx, channels: 3 } });
  if (gps) {
    picture = picture.withExif({
      IFD0: { Make: 'Invented Camera Works' },
      IFD3: {
        GPSLatitudeRef: 'N',
        GPSLatitude: '52/1 30/1 0/1',
        GPSLongitudeRef: 'E',
        GPSLongitude: '13/1 24/1 0/1',
      },
    });
  }
  if (orientation) picture = picture.withMetadata({ orientation });
  const jpeg = await picture.jpeg({ quality }).toBuffer();
  return { widthPx, heightPx, baselineY, frontY, lanes: drawn, jpeg };
}
