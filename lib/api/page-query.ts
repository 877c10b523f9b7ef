import { type z } from 'zod';

/** `searchParams` of a page. */
export type PageSearch = Promise<Record<string, string | string[] | undefined>>;

/**
 * The query of a page by the schema of its list's route. Unlike a request to the API, an address with something odd in it still opens
 * the page: what cannot be used falls back to its default, field by field.
 */
export function queryOfPage<Schema extends z.ZodObject>(schema: Schema, search: Record<string, string | string[] | undefined>): z.output<Schema> {
  const usable: Record<string, string> = {};
  for (const [name, value] of Object.entries(search)) {
    if (typeof value === 'string' && name in schema.shape && (schema.shape[name] as z.ZodType).safeParse(value).success) usable[name] = value;
  }
  return schema.parse(usable);
}
