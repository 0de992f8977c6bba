import * as z from 'zod';

/** Query of a list that is read page by page: `after` is the `next` of the page before. */
export const pageQuery = z.object({
  after: z.string().max(200).optional(),
  limit: z.coerce.number().int().min(1).max(200).default(50),
});

/** A page of a list; `next` is null on the last one. */
export function pageOf<T extends z.ZodType>(item: T) {
  return z.object({ items: z.array(item), next: z.string().nullable() });
}
