import { type z } from 'zod';

export type SearchParams = Promise<Record<string, string | string[] | undefined>>;

/**
 * The query of a page by the schema of its list; what cannot be used is dropped rather than refused: people edit addresses by hand,
 * and a page that opens helps them more than an error.
 */
export async function readPageQuery<Shape extends z.ZodRawShape>(schema: z.ZodObject<Shape>, searchParams: SearchParams): Promise<z.output<z.ZodObject<Shape>>> {
  const query: Record<string, string | string[] | undefined> = { ...(await searchParams) };
  const parsed = schema.safeParse(query);
  if (parsed.success) return parsed.data;
  for (const issue of parsed.error.issues) delete query[String(issue.path[0])];
  return schema.parse(query);
}
