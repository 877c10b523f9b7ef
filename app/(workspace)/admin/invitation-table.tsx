import { takeBackInvitation } from '@/app/(workspace)/admin/actions';
import { ConfirmedAction } from '@/components/access/confirmed-action';
import { Moment } from '@/components/access/moment';
import { Cell, HeadCell, SimpleTable } from '@/components/access/simple-table';
import { type InvitationView } from '@/lib/access/invitations';

export function InvitationTable({ invitations }: { invitations: InvitationView[] }) {
  return (
    <SimpleTable
      caption="Open invitations"
      head={
        <>
          <HeadCell>Name</HeadCell>
          <HeadCell>E-mail</HeadCell>
          <HeadCell>Role</HeadCell>
          <HeadCell>Works until</HeadCell>
          <HeadCell>
            <span className="sr-only">Take back</span>
          </HeadCell>
        </>
      }
    >
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
    </SimpleTable>
  );
}
