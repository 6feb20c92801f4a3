/** Textures of verdicts on the map and the load picture, as SVG patterns (units of the picture: pixels). */

const tiles: Readonly<
  Record<
    string,
    {
      readonly size: number;
      readonly d: string;
      readonly width: number;
      readonly dots?: number;
    }
  >
> = {
  'cross-hatch': { size: 9, d: 'M0 9L9 0M0 0L9 9', width: 0.9 },
  hatch: { size: 8, d: 'M-2 2L2 -2M0 8L8 0M6 10L10 6', width: 1 },
  verticals: { size: 6, d: 'M3 0V6', width: 1 },
  waves: { size: 10, d: 'M0 5Q2.5 2 5 5T10 5', width: 1 },
  chevrons: { size: 10, d: 'M2 7L5 4L8 7', width: 1 },
  dots: { size: 7, d: '', width: 0, dots: 1 },
};

/** `<pattern>` element of a texture in one colour; an unknown name gives an empty pattern. */
export function textureDefinition(id: string, name: string, colour: string): string {
  const tile = tiles[name];
  if (!tile) return `<pattern id="${id}" width="1" height="1" patternUnits="userSpaceOnUse"/>`;
  const mark = tile.dots
    ? `<circle cx="3.5" cy="3.5" r="${tile.dots}" fill="${colour}"/>`
    : `<path d="${tile.d}" fill="none" stroke="${colour}" stroke-width="${tile.width}"/>`;
  return `<pattern id="${id}" width="${tile.size}" height="${tile.size}" patternUnits="userSpaceOnUse">${mark}</pattern>`;
}
