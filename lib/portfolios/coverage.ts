import { type PortfolioDetail } from '@/lib/api/types';
import { asItStands } from '@/lib/catalogue/reading/as-it-stands';
import { standingMember } from '@/lib/catalogue/reading/work-items';
import { select } from '@/lib/db/bulk';

type Coverage = PortfolioDetail['coverage'];

/** Share of the catalogue from which on links are counted from the cited works: they are then far fewer than the references to look up. */
const largeShare = 0.05;

async function countMembers(portfolioId: number): Promise<Pick<Coverage, 'cataloguedWorks' | 'worksWithReferences' | 'references'>> {
  const [row] = await select<{ works: number; citing: number; read: number }>(
    null,
    `SELECT COUNT(*) AS works, COALESCE(SUM(work.referenceCount > 0), 0) AS citing, COALESCE(SUM(work.referenceCount), 0) AS \`read\`
     FROM portfolio_works membership JOIN works work ON work.id = membership.workId AND work.catalogued = 1 WHERE ${standingMember}`,
    { portfolioId },
  );
  return { cataloguedWorks: Number(row.works), worksWithReferences: Number(row.citing), references: Number(row.read) };
}

/** References of members that were linked to a catalogued work. The same rows joined in one of two orders; the optimiser's own choice took twenty times as long on a large portfolio. */
async function countLinked(portfolioId: number, fromCited: boolean): Promise<number> {
  const tables = fromCited
    ? `works cited JOIN reference_variants variant ON variant.workId = cited.id JOIN cited_references reference ON reference.variantHash = variant.hash
       JOIN import_records record ON record.id = reference.recordId JOIN portfolio_works membership ON membership.workId = record.workId`
    : `portfolio_works membership JOIN import_records record ON record.workId = membership.workId JOIN cited_references reference ON reference.recordId = record.id
       JOIN reference_variants variant ON variant.hash = reference.variantHash JOIN works cited ON cited.id = variant.workId`;
  const [{ linked }] = await select<{ linked: number }>(null, `SELECT STRAIGHT_JOIN COUNT(*) AS linked FROM ${tables} WHERE ${standingMember} AND record.citing = 1 AND cited.catalogued = 1`, { portfolioId });
  return Number(linked);
}

async function countCitedOnly(portfolioId: number): Promise<number> {
  const [{ works }] = await select<{ works: number }>(
    null,
    `SELECT COUNT(*) AS works FROM (SELECT DISTINCT citation.citedWorkId AS workId FROM portfolio_works membership JOIN citations citation ON citation.citingWorkId = membership.workId WHERE ${standingMember}) linked
     JOIN works work ON work.id = linked.workId AND work.catalogued = 0`,
    { portfolioId },
  );
  return Number(works);
}

/**
 * Coverage of the portfolio as it stands now, counted as analyses count it (lib/analyses/input): `references` are the entries of the
 * reference lists by which its catalogued works cite, `linkedReferences` those that lead to a catalogued work.
 */
export async function readCoverage(portfolioId: number): Promise<Coverage> {
  return asItStands(portfolioId, 'coverage', async () => {
    const [members, citedOnlyWorks, [{ catalogue }]] = await Promise.all([
      countMembers(portfolioId), countCitedOnly(portfolioId), select<{ catalogue: number }>(null, 'SELECT COUNT(*) AS catalogue FROM works WHERE catalogued = 1'),
    ]);
    const linkedReferences = await countLinked(portfolioId, members.cataloguedWorks > largeShare * Number(catalogue));
    return { ...members, linkedReferences, citedOnlyWorks };
  });
}
