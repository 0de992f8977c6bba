/** Whether two values of JSON say the same, whatever the order of their keys. */
export function sameValue(one: unknown, other: unknown): boolean {
  if (one === other) return true;
  if (typeof one !== 'object' || typeof other !== 'object' || one === null || other === null) return false;
  if (Array.isArray(one) !== Array.isArray(other)) return false;
  const [first, second] = [Object.entries(one), new Map<string, unknown>(Object.entries(other))];
  return (
    first.length === second.size && first.every(([key, value]) => second.has(key) && sameValue(value, second.get(key)))
  );
}
