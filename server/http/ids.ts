import { z } from 'zod';

/** An id in a path. Anything else is "nothing here", as for an unknown id. */
export const idSchema = z
  .string()
  .regex(/^[1-9]\d{0,14}$/)
  .transform(Number);
export const idParams = z.object({ id: idSchema });
export const pageQuery = z.strictObject({
  page: z.coerce.number().int().min(1).max(10_000).default(1),
});
