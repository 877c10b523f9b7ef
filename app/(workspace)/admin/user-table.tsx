import { setDisabled } from '@/app/(workspace)/admin/actions';
import { RoleForm } from '@/app/(workspace)/admin/role-form';
import { ConfirmedAction } from '@/components/access/confirmed-action';
import { Moment } from '@/components/access/moment';
import { Cell, ColumnHead, Table, TableBody, TableHead } from '@/components/ui/table';
import { Pill } from '@/components/ui/status';
import { type UserView } from '@/lib/access/users';

export function UserTable({ users, ownId }: { users: UserView[]; ownId: string }) {
  return (
    <Table caption="Accounts">
      <TableHead>
        <ColumnHead>Name</ColumnHead>
        <ColumnHead>E-mail</ColumnHead>
        <ColumnHead>Role</ColumnHead>
        <ColumnHead>Last signed in</ColumnHead>
        <ColumnHead>Access</ColumnHead>
      </TableHead>
      <TableBody>
        {users.map((user) => (
          <tr key={user.id}>
            <Cell>
              {user.name}
              {user.demonstration && <span className="block"><Pill>Demonstration</Pill></span>}
            </Cell>
            <Cell>{user.email}</Cell>
            <Cell>
              <RoleForm userId={user.id} name={user.name} role={user.role} />
            </Cell>
            <Cell>{user.lastSignInAt ? <Moment at={user.lastSignInAt} /> : 'never'}</Cell>
            <Cell>
              {user.id === ownId ? (
                <span className="text-ink-soft">This is you</span>
              ) : user.disabled ? (
                <>
                  <Pill tone="problem">Disabled</Pill>
                  <ConfirmedAction action={setDisabled} fields={{ id: user.id, disabled: 'no' }} label="Enable" subject={user.name} />
                </>
              ) : (
                <ConfirmedAction action={setDisabled} fields={{ id: user.id, disabled: 'yes' }} label="Disable" subject={user.name} question={`${user.name} is signed out at once and can no longer sign in; their tokens stop working.`} />
              )}
            </Cell>
          </tr>
        ))}
      </TableBody>
    </Table>
  );
}
