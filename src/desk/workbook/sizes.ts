/** Excel's standard column of 8.43 characters and its standard row of 15 points, in the grid's pixels. */
export const standardWidth = 64;
export const standardHeight = 20;

export const pointsPerPixel = 0.75;

/** Width of a digit of the normal font and the room Excel leaves beside it, in pixels. */
const characterPixels = 7;
const paddingPixels = 5;

export const pixelsOf = (characters: number): number => Math.round(characters * characterPixels + paddingPixels);

export const charactersOf = (pixels: number): number =>
  Math.max(0, Math.round(((pixels - paddingPixels) / characterPixels) * 100) / 100);
