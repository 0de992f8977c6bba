function demandCount(argument: string, value: number): void {
  if (!Number.isSafeInteger(value) || value < 1) {
    throw new RangeError(`${argument} must be a whole number of at least 1, not ${value}.`);
  }
}

/**
 * Units in each carton of a lot that is packed evenly; the first cartons hold the units left over.
 *
 * @param lotSize units in the lot
 * @throws {RangeError} unless both are whole numbers of at least 1 and no carton stays empty
 */
export function cartonSizes(lotSize: number, cartons: number): number[] {
  demandCount('lotSize', lotSize);
  demandCount('cartons', cartons);
  if (cartons > lotSize)
    throw new RangeError(`cartons must not outnumber the units of the lot: ${cartons} for ${lotSize}.`);
  const even = Math.floor(lotSize / cartons);
  const leftOver = lotSize % cartons;
  return Array.from({ length: cartons }, (_, index) => even + (index < leftOver ? 1 : 0));
}

/**
 * The carton, from 1, that holds a position of the lot, positions being numbered from 1 through the cartons in order.
 *
 * @throws {RangeError} for a position outside the lot, or cartons that cannot be packed
 */
export function cartonOf(position: number, lotSize: number, cartons: number): number {
  const sizes = cartonSizes(lotSize, cartons);
  if (!Number.isSafeInteger(position) || position < 1 || position > lotSize) {
    throw new RangeError(`position must be a whole number from 1 to ${lotSize}, not ${position}.`);
  }
  const even = Math.floor(lotSize / cartons);
  const inLargerCartons = (lotSize % cartons) * (even + 1);
  if (position <= inLargerCartons) return Math.ceil(position / (even + 1));
  return sizes.length - Math.floor((lotSize - position) / even);
}
