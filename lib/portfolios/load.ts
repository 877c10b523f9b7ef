import { type Actor } from '@/lib/access/permissions';
import { type Loaded } from '@/lib/api/route';
import { Portfolio } from '@/models/portfolio';

/** The portfolio of an address; the wrapper settles whether the person may see it. A deleted one does not exist. */
export async function loadPortfolio({ params }: { actor: Actor; params: { portfolioId: number } }): Promise<Loaded<Portfolio>> {
  const row = await Portfolio.findOne({ where: { id: params.portfolioId, deletedAt: null } });
  return row && { row, portfolioId: row.id };
}
