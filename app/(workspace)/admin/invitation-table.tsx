import { takeBackInvitation } from '@/app/(workspace)/admin/actions';
import { ConfirmedAction } from '@/components/access/confirmed-action';
import { Moment } from '@/components/access/moment';
import { Cell, ColumnHead, Table, TableBody, TableHead } from '@/components/ui/table';
import { type InvitationView } from '@/lib/access/invitations';

export function InvitationTable({ invitations }: { invitations: InvitationView[] }) {
  return (
    <Table caption="Open invitations">
      <TableHead>
        <ColumnHead>Name</ColumnHead>
        <ColumnHead>E-mail</ColumnHead>
        <ColumnHead>Role</ColumnHead>
        <ColumnHead>Works until</ColumnHead>
        <ColumnHead>
        <span className="sr-only">Take back</span>
        </ColumnHead>
      </TableHead>
      <TableBody>
        {invitations.map((invitation) => (
          <tr key={invitation.id}>
            <Cell>{invitation.name}</Cell>
            <Cell>{invitation.email}</Cell>
            <Cell>{invitation.role}</Cell>
            <Cell>
              <Moment at={invitation.expiresAt} dateOnly />
            </Cell>
            <Cell>
              <ConfirmedAction action={takeBackInvitation} fields={{ id: invitation.id }} label="Take back" subject={invitation.name} question={`The link mailed to ${invitation.email} stops working.`} />
            </Cell>
          </tr>
        ))}
      </TableBody>
    </Table>
  );
}
