/** A picture's size in points as a player shows it: turned upright, with square points. */
export type Size = { width: number; height: number };

const even = (value: number): number => Math.max(2, 2 * Math.round(value / 2));

/**
 * Size of a rendition by its name: "480p" is 480 points on the shorter side, so that a film held upright stays upright and just as sharp.
 * Never larger than the source; even, as H.264 with 4:2:0 needs it.
 */
export function renditionSize(source: Size, shorterSide: number): Size {
  const scale = Math.min(1, shorterSide / Math.min(source.width, source.height));
  return { width: even(source.width * scale), height: even(source.height * scale) };
}
