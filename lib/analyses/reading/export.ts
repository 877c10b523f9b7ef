import { restrictMap } from '@/components/map/restrict-map';
import { drawStaticMap } from '@/components/map/static-map';
import { graphml } from '@/lib/analyses/reading/export-network';
import { csvTable, jsonTable } from '@/lib/analyses/reading/export-table';
import { readMap } from '@/lib/analyses/reading/map';
import { provenanceLine, provenanceOf, type Provenance } from '@/lib/analyses/reading/provenance';
import { type ExportQuery } from '@/lib/analyses/reading/queries';
import { walkAnalysisWorks, workIdsOf } from '@/lib/analyses/reading/works';
import { type AnalysisMap } from '@/lib/api/types';
import { type Analysis } from '@/models/analysis';
import { Portfolio } from '@/models/portfolio';

const contentTypes = { csv: 'text/csv; charset=utf-8; header=present', json: 'application/json; charset=utf-8', graphml: 'application/graphml+xml; charset=utf-8', svg: 'image/svg+xml; charset=utf-8' } as const;

async function drawnMap(analysis: Analysis, query: ExportQuery): Promise<AnalysisMap> {
  const [map, keep] = await Promise.all([readMap(analysis.id, query.basis), workIdsOf(analysis.id, query)]);
  return restrictMap(map, keep);
}

async function* content(analysis: Analysis, query: ExportQuery, provenance: Provenance): AsyncGenerator<string> {
  switch (query.format) {
    case 'csv':
      return yield* csvTable(walkAnalysisWorks(analysis.id, query));
    case 'json':
      return yield* jsonTable(provenance, walkAnalysisWorks(analysis.id, query));
    case 'graphml':
      return yield* graphml(await drawnMap(analysis, query), provenance);
    case 'svg':
      return yield drawStaticMap(await drawnMap(analysis, query), { scheme: query.scheme, title: provenance.portfolio, caution: provenance.cautions[0], provenance: provenanceLine(provenance) });
  }
}

function streamOf(chunks: AsyncGenerator<string>): ReadableStream<Uint8Array> {
  const encoder = new TextEncoder();
  return new ReadableStream({
    async pull(controller) {
      const { done, value } = await chunks.next();
      if (done) controller.close();
      else controller.enqueue(encoder.encode(value));
    },
    async cancel() {
      await chunks.return(undefined);
    },
  });
}

/** The table or network of a finished analysis as a file, with the filters and the order of the screen that it was asked from. */
export async function exportAnalysis(analysis: Analysis, query: ExportQuery): Promise<Response> {
  const portfolio = await Portfolio.findByPk(analysis.portfolioId, { attributes: ['name'] });
  const provenance = provenanceOf(analysis, portfolio?.name ?? '', query);
  const chunks = content(analysis, query, provenance);
  const what = query.format === 'csv' || query.format === 'json' ? 'rankings' : `map-${query.basis}`;
  return new Response(streamOf(chunks), {
    headers: {
      'Content-Type': contentTypes[query.format],
      'Content-Disposition': `attachment; filename="heddle-analysis-${analysis.id}-${what}.${query.format}"`,
      'Cache-Control': 'no-store',
    },
  });
}
