import { dropToken } from '@/app/(workspace)/account/actions';
import { ConfirmedAction } from '@/components/access/confirmed-action';
import { Cell, ColumnHead, Table, TableBody, TableHead } from '@/components/ui/table';
import { Moment } from '@/components/access/moment';
import { type TokenView } from '@/lib/access/tokens';

export function TokenTable({ tokens }: { tokens: TokenView[] }) {
  if (tokens.length === 0) return <p>You have no tokens yet.</p>;
  return (
    <Table caption="Your tokens">
      <TableHead>
        <ColumnHead>Token</ColumnHead>
        <ColumnHead>Ends with</ColumnHead>
        <ColumnHead>Made</ColumnHead>
        <ColumnHead>Last used</ColumnHead>
        <ColumnHead>Works until</ColumnHead>
        <ColumnHead>
        <span className="sr-only">Revoke</span>
        </ColumnHead>
      </TableHead>
      <TableBody>
        {tokens.map((token) => (
          <tr key={token.id}>
            <Cell>{token.name}</Cell>
            <Cell>
              <code className="font-mono text-[13px]">{token.hint}</code>
            </Cell>
            <Cell>
              <Moment at={token.createdAt} />
            </Cell>
            <Cell>{token.lastUsedAt ? <Moment at={token.lastUsedAt} /> : 'never'}</Cell>
            <Cell>{token.expiresAt ? <Moment at={token.expiresAt} dateOnly /> : 'no end'}</Cell>
            <Cell>
              <ConfirmedAction action={dropToken} fields={{ id: token.id }} label="Revoke" subject={token.name} question={`Scripts that use "${token.name}" stop working. This cannot be undone.`} />
            </Cell>
          </tr>
        ))}
      </TableBody>
    </Table>
  );
}
