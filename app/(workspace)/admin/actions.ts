'use server';

import { revalidatePath } from 'next/cache';
import { z } from 'zod';

import { action } from '@/lib/access/action';
import { emailField, personNameField } from '@/lib/access/email';
import { createInvitation, revokeInvitation } from '@/lib/access/invitations';
import { roles } from '@/lib/access/permissions';
import { unitKindField, unitNameField } from '@/lib/access/unit-fields';
import { changeUnit, createUnit, deleteUnit } from '@/lib/access/units';
import { changeUser } from '@/lib/access/users';
import { id } from '@/lib/api/schemas';

const role = z.enum(roles, 'Choose a role.');

export const invite = action('user.manage', z.object({ email: emailField, name: personNameField, role }), async ({ actor, input, headers }) => {
  await createInvitation(actor, input, headers);
  revalidatePath('/admin');
  return { done: `${input.name} was invited. The link works for 14 days and stands under Mail.` };
});

export const takeBackInvitation = action('user.manage', z.object({ id }), async ({ actor, input, headers }) => {
  await revokeInvitation(actor, input.id, headers);
  revalidatePath('/admin');
  return { done: 'The invitation was taken back.' };
});

export const changeRole = action('user.manage', z.object({ id, role }), async ({ actor, input, headers }) => {
  const user = await changeUser(actor, input.id, { role: input.role }, headers);
  revalidatePath('/admin');
  return { done: `${user.name} is now ${user.role}.` };
});

export const setDisabled = action('user.manage', z.object({ id, disabled: z.enum(['yes', 'no']) }), async ({ actor, input, headers }) => {
  const user = await changeUser(actor, input.id, { disabled: input.disabled === 'yes' }, headers);
  revalidatePath('/admin');
  return { done: user.disabled ? `${user.name} can no longer sign in.` : `${user.name} can sign in again.` };
});

/** A select sends an empty text for "stands at the top". */
const parentId = z.union([z.literal('').transform(() => null), id]);
const unitForm = { name: unitNameField, kind: unitKindField, parentId };

export const addUnit = action('unit.manage', z.object(unitForm), async ({ actor, input, headers }) => {
  const unit = await createUnit(actor, input, headers);
  revalidatePath('/admin/units');
  return { done: `${unit.name} was added.` };
});

export const saveUnit = action('unit.manage', z.object({ id, ...unitForm }), async ({ actor, input: { id: unitId, ...fields }, headers }) => {
  const unit = await changeUnit(actor, unitId, fields, headers);
  revalidatePath('/admin/units');
  return { done: `${unit.name} was changed.` };
});

export const removeUnit = action('unit.manage', z.object({ id }), async ({ actor, input, headers }) => {
  await deleteUnit(actor, input.id, headers);
  revalidatePath('/admin/units');
  return { done: 'The unit was removed.' };
});
