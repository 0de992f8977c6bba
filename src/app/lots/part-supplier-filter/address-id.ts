/** An id as it stands in an address; undefined when there is none or it is no id. */
export function addressId(text: unknown): number | undefined {
  const id = Number(text);
  return Number.isInteger(id) && id > 0 ? id : undefined;
}
