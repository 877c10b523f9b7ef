import { notFound } from 'next/navigation';
import { cache } from 'react';

import { may } from '@/lib/access/permissions';
import { loadAnalysis, presentAnalyses } from '@/lib/analyses/reading/analyses';
import { chooseCluster, listClusters } from '@/lib/analyses/reading/clusters';
import { exportCautions } from '@/lib/analyses/reading/methods';
import { provenanceLine } from '@/lib/analyses/reading/provenance';
import { analysisWorksQuery, clustersQuery, mapQuery } from '@/lib/analyses/reading/queries';
import { readSpread } from '@/lib/analyses/reading/spread';
import { listAnalysisWorks, topWorksInLoops } from '@/lib/analyses/reading/works';
import { queryOfPage } from '@/lib/api/page-query';
import { type AnalysisView } from '@/lib/api/types';
import { defaultParameters, type AnalysisParameters } from '@/lib/network/types';
import { idOfPage, portfolioForPage, type PortfolioOnPage } from '@/lib/portfolios/page';
import { Analysis } from '@/models/analysis';
import { type Portfolio } from '@/models/portfolio';

export interface AnalysesOnPage extends PortfolioOnPage {
  /** Finished analyses to choose from, newest first. */
  finished: AnalysisView[];
  /** The one that the page shows: the one of the address, or else the newest. Null while there is none. */
  chosen: AnalysisView | null;
  /** The newest analysis of all where it has not finished: waiting, running, failed or cancelled. */
  latest: AnalysisView | null;
  mayRun: boolean;
  mayExport: boolean;
}

const mostChoices = 50;

/** What every page that shows an analysis needs. An address that names no finished analysis of this portfolio shows the newest one. */
export const analysesForPage = cache(async (portfolioId: string, asked: string | undefined): Promise<AnalysesOnPage> => {
  const page = await portfolioForPage(portfolioId);
  const [rows, newest] = await Promise.all([
    Analysis.findAll({ where: { portfolioId: page.row.id, state: 'finished' }, order: [['id', 'DESC']], limit: mostChoices }),
    Analysis.findOne({ where: { portfolioId: page.row.id }, order: [['id', 'DESC']] }),
  ]);
  const named = asked && /^[1-9]\d{0,15}$/.test(asked) ? (rows.find((row) => String(row.id) === asked) ?? (await Analysis.findOne({ where: { id: Number(asked), portfolioId: page.row.id, state: 'finished' } }))) : null;
  const chosen = named ?? rows[0] ?? null;
  const all = chosen && !rows.includes(chosen) ? [...rows, chosen] : rows;
  const views = await presentAnalyses(all);
  const latest = newest && newest.state !== 'finished' ? (await presentAnalyses([newest]))[0] : null;
  return {
    ...page,
    finished: views,
    chosen: chosen ? (views[all.indexOf(chosen)] ?? null) : null,
    latest,
    mayRun: may(page.actor, 'analysis.run', page.level),
    mayExport: may(page.actor, 'export.make', page.level),
  };
});

/** The analysis of a page's address, in whatever state, in the portfolio of that address; "not found" for any other. */
export async function analysisForPage(portfolioId: string, analysisId: string): Promise<PortfolioOnPage & { analysis: AnalysisView; mayRun: boolean }> {
  const page = await portfolioForPage(portfolioId);
  const loaded = await loadAnalysis({ actor: page.actor, params: { analysisId: idOfPage(analysisId) } });
  if (!loaded || loaded.portfolioId !== page.row.id) notFound();
  return { ...page, analysis: (await presentAnalyses([loaded.row]))[0], mayRun: may(page.actor, 'analysis.run', page.level) };
}

type Search = Record<string, string | string[] | undefined>;

/** Everything that the first paint of the rankings shows. */
export async function readRankings(chosen: AnalysisView, search: Search) {
  const id = Number(chosen.id);
  const [list, cocitation, coupling, citation, inDegree, pageRank, loops] = await Promise.all([
    listAnalysisWorks(id, queryOfPage(analysisWorksQuery, search)),
    chooseCluster(id, 'cocitation'),
    chooseCluster(id, 'coupling'),
    chooseCluster(id, 'citation'),
    readSpread(id, 'inDegree'),
    readSpread(id, 'pageRank'),
    topWorksInLoops(id),
  ]);
  return { list, clusters: { cocitation, coupling, citation }, spreads: { inDegree, pageRank }, loops };
}

/** Everything that the first paint of the clusters shows. */
export async function readClusters(chosen: AnalysisView, search: Search) {
  const query = queryOfPage(clustersQuery, search);
  return { basis: query.basis, list: await listClusters(Number(chosen.id), query) };
}

/** What the form for a new analysis begins with: the parameters of an earlier one, or the defaults within the portfolio's period. */
export async function firstParameters(portfolio: Pick<Portfolio, 'id' | 'periodFrom' | 'periodTo'>, like: string | null): Promise<AnalysisParameters> {
  const earlier = like && /^[1-9]\d{0,15}$/.test(like) ? await Analysis.findOne({ where: { id: Number(like), portfolioId: portfolio.id } }) : null;
  return earlier?.parameters ?? { ...defaultParameters, periodFrom: portfolio.periodFrom ?? null, periodTo: portfolio.periodTo ?? null };
}

/** What the page of the map knows before the map itself is read. */
export function readMapPage(chosen: AnalysisView, portfolio: string, search: Search) {
  const { basis } = queryOfPage(mapQuery, search);
  const provenance = provenanceLine({ portfolio, analysisId: chosen.id, finishedAt: chosen.finishedAt, parameters: chosen.parameters, fingerprints: chosen.fingerprints });
  return { basis, caution: exportCautions(chosen.coverage)[0], provenance };
}
