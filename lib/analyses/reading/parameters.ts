import { z } from 'zod';

import { yearOrNull } from '@/lib/api/schemas';
import { defaultParameters, similarities } from '@/lib/network/types';

const whole = (least: number, most: number) => z.number().int('must be a whole number').min(least).max(most);

/**
 * The parameters of a new analysis as the API takes them: every one may be left out, nothing unknown may stand beside them.
 * The bounds keep one request from asking for more than the service can compute; within them every combination is valid.
 */
export const analysisParameters = z
  .strictObject({
    scope: z.enum(['catalogued', 'with-cited']).default(defaultParameters.scope),
    periodFrom: yearOrNull.default(defaultParameters.periodFrom),
    periodTo: yearOrNull.default(defaultParameters.periodTo),
    minimumCitations: whole(1, 1_000).default(defaultParameters.minimumCitations),
    damping: z.number().min(0.05).max(0.95).default(defaultParameters.damping),
    similarity: z.enum(similarities).default(defaultParameters.similarity),
    clustering: z.enum(['leiden', 'louvain']).default(defaultParameters.clustering),
    resolution: z.number().min(0.05).max(20).default(defaultParameters.resolution),
    repeats: whole(1, 100).default(defaultParameters.repeats),
    replicates: whole(0, 2_000).default(defaultParameters.replicates),
    maximumReferences: whole(2, 5_000).default(defaultParameters.maximumReferences),
    seed: whole(0, 4_294_967_295).default(defaultParameters.seed),
  })
  .refine(({ periodFrom, periodTo }) => periodFrom === null || periodTo === null || periodFrom <= periodTo, { path: ['periodTo'], message: 'must not be before the first year' });

export const newAnalysis = z.strictObject({ parameters: analysisParameters.prefault({}) });
