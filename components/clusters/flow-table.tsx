import { clusterName } from '@/components/analyses/work-name';
import { ClusterSwatch } from '@/components/ui/cluster-swatch';
import { formatNumber } from '@/components/ui/numbers';
import { Cell, ColumnHead, RowHead, Table, TableBody, TableHead } from '@/components/ui/table';
import { type AnalysisClusterItem } from '@/lib/api/types';

const mostClusters = 12;

/** How clusters cite each other: citing cluster to cited cluster. Cells are shaded by their share of the row, so that a large cluster does not outshine the rest. */
export function FlowTable({ clusters }: { clusters: readonly AnalysisClusterItem[] }) {
  const shown = clusters.slice(0, mostClusters);
  if (shown.length < 2) return null;
  return (
    <div className="grid gap-2">
      <Table caption="Citations between clusters" className="w-auto!">
        <TableHead>
          <ColumnHead>Citing, down; cited, across</ColumnHead>
          {shown.map((cluster) => <ColumnHead key={cluster.letter} numeric className="min-w-14"><ClusterSwatch index={cluster.number} letter={cluster.letter} /></ColumnHead>)}
        </TableHead>
        <TableBody>
          {shown.map((citing) => {
            const sum = citing.citesClusters.reduce((total, one) => total + one.citations, 0);
            return (
              <tr key={citing.letter}>
                <RowHead className="max-w-72 whitespace-nowrap"><ClusterSwatch index={citing.number} letter={citing.letter} name={clusterName(citing.name)} className="max-w-full overflow-hidden text-ellipsis" /></RowHead>
                {shown.map((cited) => {
                  const citations = citing.citesClusters.find((one) => one.letter === cited.letter)?.citations ?? 0;
                  const share = sum > 0 ? citations / sum : 0;
                  return (
                    <Cell key={cited.letter} numeric style={{ backgroundColor: citations > 0 ? `color-mix(in srgb, var(--bar) ${Math.round(6 + share * 44)}%, transparent)` : undefined }} className={citing.letter === cited.letter ? 'font-semibold' : undefined}>
                      {citations === 0 ? <span className="text-ink-soft">0</span> : formatNumber(citations)}
                    </Cell>
                  );
                })}
              </tr>
            );
          })}
        </TableBody>
      </Table>
      <p className="text-small text-ink-soft">Citations of works in the cluster on the left to works in the cluster above; shaded by the share of the row.{clusters.length > mostClusters && ` The ${mostClusters} largest of ${formatNumber(clusters.length)} clusters.`}</p>
    </div>
  );
}
