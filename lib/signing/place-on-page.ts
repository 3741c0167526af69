import type { PDFPage } from '@cantoo/pdf-lib';

/** x, y, width, height in points from the lower left corner of the page as a reader sees it. */
export type Box = readonly [x: number, y: number, width: number, height: number];

export interface Placed {
  /** The same box in the page's own axes, as an annotation wants it: two opposite corners. */
  readonly rect: number[];
  /** Turns an appearance drawn upright so that it is seen upright. */
  readonly matrix: number[];
}

/** Places a box on a page that may be turned (/Rotate) or cropped. Throws when it does not fit the page. */
export function placeOnPage(page: PDFPage, [x, y, w, h]: Box): Placed {
  const crop = page.getCropBox();
  const angle = ((page.getRotation().angle % 360) + 360) % 360;
  const [seenWidth, seenHeight] = angle % 180 === 0 ? [crop.width, crop.height] : [crop.height, crop.width];
  if (x < 0 || y < 0 || w <= 0 || h <= 0 || x + w > seenWidth || y + h > seenHeight) {
    throw new RangeError('the signature field does not fit its page');
  }
  const at = (left: number, low: number, width: number, height: number) => [
    crop.x + left,
    crop.y + low,
    crop.x + left + width,
    crop.y + low + height,
  ];
  switch (angle) {
    case 0:
      return { rect: at(x, y, w, h), matrix: [1, 0, 0, 1, 0, 0] };
    case 90:
      return { rect: at(crop.width - y - h, x, h, w), matrix: [0, 1, -1, 0, 0, 0] };
    case 180:
      return { rect: at(crop.width - x - w, crop.height - y - h, w, h), matrix: [-1, 0, 0, -1, 0, 0] };
    case 270:
      return { rect: at(y, crop.height - x - w, h, w), matrix: [0, -1, 1, 0, 0, 0] };
    default:
      throw new RangeError(`page turned by ${angle}°`);
  }
}
