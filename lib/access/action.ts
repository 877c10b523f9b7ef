import { randomUUID } from 'node:crypto';

import { headers as requestHeaders } from 'next/headers';
import { unstable_rethrow } from 'next/navigation';
import { type z } from 'zod';

import { actorForPage, requireRole } from '@/lib/access/actor';
import { type FormState } from '@/lib/access/form-state';
import { type Action, type Actor } from '@/lib/access/permissions';
import { checkRequestRate } from '@/lib/access/rate-limits';
import { ExpectedError } from '@/lib/errors';
import { log } from '@/lib/log';

interface ActionContext<Input, Who> {
  actor: Who;
  input: Input;
  /** For the audit log and the limits by address. */
  headers: Headers;
}

type FormAction = (state: FormState, form: FormData) => Promise<FormState>;
type ActionResult = Promise<{ done?: string; data?: Record<string, string> } | void>;

function readForm(form: FormData): Record<string, string> {
  const fields: Record<string, string> = {};
  // Names that begin with $ are React's own; files have no place in these forms.
  for (const [name, value] of form) if (typeof value === 'string' && !name.startsWith('$')) fields[name] = value;
  return fields;
}

/** What the form is filled with again after a failure: all that was typed, except secrets. */
function keepValues(fields: Record<string, string>): Record<string, string> {
  return Object.fromEntries(Object.entries(fields).filter(([name]) => !/password|current|token|secret/i.test(name)));
}

/**
 * The one guard of server actions, in the order of the API's wrapper: session, rate limit, permission, schema, handler, one catch.
 * Next itself compares Origin with Host before it comes here. `permission` null: for people who are not signed in; such handlers limit
 * tries themselves. A portfolio's grant is the handler's to check, through its service.
 */
export function action<Schema extends z.ZodType>(permission: null, schema: Schema, handler: (context: ActionContext<z.output<Schema>, null>) => ActionResult): FormAction;
export function action<Schema extends z.ZodType>(permission: Action, schema: Schema, handler: (context: ActionContext<z.output<Schema>, Actor>) => ActionResult): FormAction;
export function action<Schema extends z.ZodType>(permission: Action | null, schema: Schema, handler: (context: ActionContext<z.output<Schema>, never>) => ActionResult): FormAction {
  return async (_state, form) => {
    const fields = readForm(form);
    const failed = (error: string, errors: Record<string, string> = {}): FormState => ({ error, errors, values: keepValues(fields), done: null, data: {} });
    try {
      let actor: Actor | null = null;
      if (permission !== null) {
        actor = await actorForPage();
        await checkRequestRate(actor);
        requireRole(actor, permission);
      }
      const parsed = schema.safeParse(fields);
      if (!parsed.success) {
        const errors: Record<string, string> = {};
        for (const issue of parsed.error.issues) errors[issue.path.join('.')] ??= issue.message;
        return failed('Nothing was changed yet. Look at the marked fields.', errors);
      }
      const result = await handler({ actor: actor as never, input: parsed.data, headers: await requestHeaders() });
      return { error: null, errors: {}, values: {}, done: result?.done ?? null, data: result?.data ?? {} };
    } catch (error) {
      // Redirects travel as errors; they are Next's to catch.
      unstable_rethrow(error);
      if (error instanceof ExpectedError) return failed(error.message, (error.extra.errors as Record<string, string> | undefined) ?? {});
      const requestId = randomUUID();
      log().error({ requestId, error: error instanceof Error ? { message: error.message, stack: error.stack } : error }, 'unexpected error in an action');
      return failed(`Something went wrong on our side and nothing was changed. Tell your administrator this number: ${requestId}.`);
    }
  };
}
