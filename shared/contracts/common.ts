import { z } from 'zod';

export const idParams = z.object({ id: z.uuid() });
export const noParams = z.object({});
export const noQuery = z.object({});

/** A time as the API writes it: ISO 8601 in UTC. */
export const timeSchema = z.iso.datetime();

export const pageQuery = {
  cursor: z.string().max(400).optional(),
  limit: z.coerce.number().int().min(1).max(200).default(50),
};

export const pageOf = <Item extends z.ZodType>(item: Item) =>
  z.object({ items: z.array(item), nextCursor: z.string().nullable() });

/** A person as shown to others: never the mail address. */
export const personRefSchema = z.object({ id: z.string(), name: z.string(), lab: z.string().nullable() });
export type PersonRef = z.infer<typeof personRefSchema>;

/** An estimate with its technical standard error and interval. Null where the entries do not give it. */
export const estimateSchema = z.object({
  value: z.number().nullable(),
  standardError: z.number().nullable(),
  lower: z.number().nullable(),
  upper: z.number().nullable(),
});
