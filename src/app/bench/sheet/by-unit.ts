/** Things that belong to units, by the unit's number and in their order. */
export function byUnit<Of extends { readonly unit: number }>(all: readonly Of[]): Map<number, Of[]> {
  const grouped = new Map<number, Of[]>();
  for (const each of all) {
    const known = grouped.get(each.unit);
    if (known) known.push(each);
    else grouped.set(each.unit, [each]);
  }
  return grouped;
}
