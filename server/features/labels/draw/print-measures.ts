/*
 * Lengths on paper. Everything is drawn in millimetres, and every bar and module lies on the dots of a 203 dpi thermal
 * printer, which has 8 dots to the millimetre: a bar that ends between two dots is printed a dot too wide or too narrow.
 */

/** PDF points in a millimetre: 72 to the inch of 25.4 mm. */
export const pointsPerMm = 72 / 25.4;

/** One dot at 203 dpi (8 dots/mm), in mm. From memory; 203.2 dpi is 8 dots/mm exactly. */
export const dotMm = 0.125;

/** Width of the narrowest bar, in mm: 3 dots, so that ink or heat that creeps by half a dot does not close a gap. */
export const barModuleMm = 3 * dotMm;

/** The widest module on the dot grid with which so many modules fit into a length, in mm. */
export function moduleFitting(modules: number, lengthMm: number): number {
  return Math.floor(lengthMm / modules / dotMm + 1e-9) * dotMm;
}

/** The nearest dot, in mm. */
export function onDot(lengthMm: number): number {
  return Math.round(lengthMm / dotMm) * dotMm;
}
