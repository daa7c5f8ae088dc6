import '../model/zod-jitless';
import * as z from 'zod';

/** Types of the HTTP API that every resource uses. Replies carry camelCase fields, times as ISO 8601 in UTC. */

export const id = z.uuid();
export const isoTime = z.iso.datetime();
export const emailAddress = z.string().trim().toLowerCase().pipe(z.email().max(254));
export const sha256 = z.string().regex(/^[0-9a-f]{64}$/);

export const role = z.enum(['designer', 'lab', 'reviewer', 'fabricator', 'range', 'administrator']);
export const scope = z.enum(['read', 'predict', 'design', 'library', 'team']);

/** RFC 9457, with every fault of a request at once. `pointer` is a JSON pointer into the body, or the name of a parameter. */
export const problem = z.object({
  type: z.string(),
  title: z.string(),
  status: z.number().int(),
  detail: z.string(),
  instance: z.string().optional(),
  requestId: z.string().optional(),
  errors: z.array(z.object({ pointer: z.string(), detail: z.string() })).optional(),
});

export const idParams = z.strictObject({ id });

/** A page of a list: pass `next` as `after` to get the following one. */
export const page = <T extends z.ZodType>(item: T) => z.strictObject({ items: z.array(item), next: z.string().nullable() });
export const pageQuery = z.strictObject({
  after: z.string().max(400).optional(),
  limit: z.coerce.number().int().min(1).max(200).optional(),
});

/** Someone by name, for lists and title blocks. */
export const personName = z.strictObject({ id, name: z.string() });

export type Role = z.infer<typeof role>;
export type Scope = z.infer<typeof scope>;
export type Problem = z.infer<typeof problem>;
export type PersonName = z.infer<typeof personName>;
