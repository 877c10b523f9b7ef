import { permissions, roleMay, type Action } from '@/lib/access/permissions';
import { route } from '@/lib/api/route';

/** Who is signed in, and what their role allows. */
export const GET = route({
  action: 'account.use',
  handler: async ({ actor }) => ({
    id: String(actor.userId),
    name: actor.name,
    email: actor.email,
    role: actor.role,
    via: actor.via,
    actions: (Object.keys(permissions) as Action[]).filter((action) => roleMay(actor.role, action)),
  }),
});
