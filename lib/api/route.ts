import { randomUUID } from 'node:crypto';

import { type NextRequest } from 'next/server';
import { type z } from 'zod';

import { actorFromRequest } from '@/lib/access/actor';
import { recordAudit } from '@/lib/access/audit';
import { grantLevelOf } from '@/lib/access/grants';
import { may, permissions, roleMay, type Action, type Actor, type GrantLevel } from '@/lib/access/permissions';
import { checkRequestRate } from '@/lib/access/rate-limits';
import { assertSameOrigin } from '@/lib/access/same-origin';
import { problemResponse } from '@/lib/api/problem';
import { ExpectedError, forbidden, invalid, notFound, unauthenticated, unsupported } from '@/lib/errors';
import { log } from '@/lib/log';

/** What a loader found: the row, and the portfolio whose grant decides (null where the loader itself settled visibility). Null: there is nothing, or nothing that this person may see. */
export type Loaded<Row> = { row: Row; portfolioId: number | null } | null;

interface RouteContext<Params, Query, Body, Row> {
  request: NextRequest;
  requestId: string;
  actor: Actor;
  params: Params;
  query: Query;
  body: Body;
  row: Row;
  /** The person's grant on the portfolio concerned; administrators hold 'manage'. Null where no portfolio is concerned. */
  level: GrantLevel | null;
}

interface RouteDefinition<Params, Query, Body, Row> {
  action: Action;
  params?: z.ZodType<Params>;
  query?: z.ZodType<Query>;
  /** JSON body. Handlers that stream the body leave it out. */
  body?: z.ZodType<Body>;
  load?: (context: { actor: Actor; params: Params }) => Promise<Loaded<Row>>;
  handler: (context: RouteContext<Params, Query, Body, Row>) => Promise<unknown>;
  /** Status of a plain result; default 200. A handler may return a Response of its own instead. */
  status?: number;
  /** Written to the audit log after success. */
  audit?: (context: RouteContext<Params, Query, Body, Row>, result: unknown) => { action: string; subjectType?: string; subjectId?: string; details?: Record<string, unknown> };
}

type Handler = (request: NextRequest, context: { params: Promise<Record<string, string | string[] | undefined>> }) => Promise<Response>;

/** What a route handler tells of itself: the action that it is for, and the schemas from which the OpenAPI document is made. */
export interface DescribedRoute {
  heddleRoute: Action;
  description: { params?: z.ZodType; query?: z.ZodType; body?: z.ZodType; status: number };
}

const safeMethods = new Set(['GET', 'HEAD', 'OPTIONS']);
const bodyLimit = 1024 * 1024;

function parse<Output>(schema: z.ZodType<Output> | undefined, value: unknown, what: string): Output {
  if (!schema) return undefined as Output;
  const parsed = schema.safeParse(value);
  if (parsed.success) return parsed.data;
  const errors: Record<string, string> = {};
  for (const issue of parsed.error.issues) errors[issue.path.join('.') || what] ??= issue.message;
  throw invalid(`The ${what} cannot be used: ${Object.entries(errors).map(([field, message]) => `${field}: ${message}`).join('; ')}`, errors);
}

async function readJson(request: NextRequest): Promise<unknown> {
  const text = await request.text();
  if (text.length > bodyLimit) throw new ExpectedError(413, 'too-large', 'Too large', 'A JSON body may hold one megabyte.');
  if (text.trim() === '') return {};
  if (!/\bjson\b/i.test(request.headers.get('content-type') ?? '')) throw unsupported('Send the body as application/json.');
  try {
    return JSON.parse(text);
  } catch {
    throw invalid('The body is not valid JSON.');
  }
}

function queryOf(request: NextRequest): Record<string, string | string[]> {
  const query: Record<string, string | string[]> = {};
  for (const key of new Set(request.nextUrl.searchParams.keys())) {
    const values = request.nextUrl.searchParams.getAll(key);
    query[key] = values.length > 1 ? values : values[0];
  }
  return query;
}

/**
 * The one wrapper of every route handler. Fixed order: request id, session or token, same origin, rate limit, schemas of path, query
 * and body, the row within what the person may see, permission, handler, audit; one catch. tests/integration walks app/api and proves
 * that every exported method came from here (it carries `heddleRoute`).
 */
export function route<Params = undefined, Query = undefined, Body = undefined, Row = undefined>(
  definition: RouteDefinition<Params, Query, Body, Row>,
): Handler & DescribedRoute {
  const handler: Handler = async (request, routeContext) => {
    const requestId = randomUUID();
    try {
      const actor = await actorFromRequest(request);
      if (!actor) throw unauthenticated();
      if (!safeMethods.has(request.method) && actor.via === 'session') assertSameOrigin(request);
      await checkRequestRate(actor);
      const params = parse(definition.params, await routeContext.params, 'address');
      const query = parse(definition.query, queryOf(request), 'query');
      const body = definition.body ? parse(definition.body, await readJson(request), 'body') : (undefined as Body);
      let row = undefined as Row;
      let level: GrantLevel | null = null;
      if (definition.load) {
        const loaded = await definition.load({ actor, params });
        if (!loaded) throw notFound();
        row = loaded.row;
        if (loaded.portfolioId !== null) {
          level = await grantLevelOf(actor, loaded.portfolioId);
          if (level === null) throw notFound();
        }
      }
      const allowed = definition.load && permissions[definition.action].grant !== null ? may(actor, definition.action, level) : roleMay(actor.role, definition.action);
      if (!allowed) throw forbidden(`Your role or your grant does not allow this: ${permissions[definition.action].description.toLowerCase()}.`);
      const context = { request, requestId, actor, params, query, body, row, level };
      const result = await definition.handler(context);
      if (definition.audit) await recordAudit(actor, request, definition.audit(context, result));
      if (result instanceof Response) {
        result.headers.set('X-Request-Id', requestId);
        return result;
      }
      if (result === undefined) return new Response(null, { status: 204, headers: { 'X-Request-Id': requestId } });
      return Response.json(result, { status: definition.status ?? 200, headers: { 'X-Request-Id': requestId, 'Cache-Control': 'no-store' } });
    } catch (error) {
      if (!(error instanceof ExpectedError)) log().error({ requestId, method: request.method, path: request.nextUrl.pathname, error: error instanceof Error ? { message: error.message, stack: error.stack } : error }, 'unexpected error');
      return problemResponse(error, requestId);
    }
  };
  const { action, params, query, body, status } = definition;
  return Object.assign(handler, { heddleRoute: action, description: { params, query, body, status: status ?? 200 } });
}
