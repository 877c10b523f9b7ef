import { type AnalysisMap } from '@/lib/api/types';
import { type Basis } from '@/lib/network/types';
import { storage } from '@/lib/services/storage';

const keyOf = (analysisId: number, basis: Basis) => `analyses/${analysisId}/map-${basis}.json`;

/** The stored map as it is; it is JSON already and may be large. */
export function readMapBytes(analysisId: number, basis: Basis): Promise<Buffer> {
  return storage().read(keyOf(analysisId, basis));
}

export async function readMap(analysisId: number, basis: Basis): Promise<AnalysisMap> {
  return JSON.parse((await readMapBytes(analysisId, basis)).toString('utf8')) as AnalysisMap;
}
