import * as z from 'zod';

/** One fault of the input: where it is (path in the body, query or params) and what is wrong, in the user's words. */
export const fault = z.object({
  path: z.array(z.union([z.string(), z.number()])),
  message: z.string(),
});
export type Fault = z.infer<typeof fault>;

/** RFC 9457 problem details, with a stable code and the faults of the input. */
export const problem = z.object({
  type: z.string(),
  title: z.string(),
  status: z.int(),
  code: z.string(),
  detail: z.string().optional(),
  errors: z.array(fault).optional(),
});
export type ProblemDetails = z.infer<typeof problem>;
