import { z } from 'zod';

/** Ids travel as decimal strings and are numbers inside. */
export const id = z.string().regex(/^[1-9]\d{0,15}$/, 'must be a decimal id').transform(Number);

const whole = (least: number, most: number, fallback: number) =>
  z.string().regex(/^\d{1,9}$/, 'must be a whole number').transform(Number).pipe(z.number().min(least).max(most)).default(fallback);

/** `?page=&pageSize=&q=` of every list; sort is added by each list with the columns that it can sort by. */
export const paging = { page: whole(1, 1_000_000, 1), pageSize: whole(1, 200, 50), q: z.string().trim().max(300).optional() };

/** `sort=field` ascending, `sort=-field` descending. */
export function sortBy<const Field extends string>(fields: readonly Field[], fallback: `${'' | '-'}${NoInfer<Field>}`) {
  const allowed = fields.flatMap((field) => [field, `-${field}`]);
  return z
    .string()
    .refine((value) => allowed.includes(value), `must be one of ${allowed.join(', ')}`)
    .default(fallback)
    .transform((value) => ({ field: value.replace(/^-/, '') as Field, descending: value.startsWith('-') }));
}

export const yearOrNull = z.number().int().min(1000).max(2200).nullable();
export const yearQuery = z.string().regex(/^\d{4}$/, 'must be a year').transform(Number).optional();

/** A page of a list, as every list route gives it. */
export interface Page<Item> {
  items: Item[];
  total: number;
  page: number;
  pageSize: number;
}
