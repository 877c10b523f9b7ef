import { z } from 'zod';

import { permissions } from '@/lib/access/permissions';
import { type DescribedRoute } from '@/lib/api/route';

export const methods = ['GET', 'POST', 'PUT', 'PATCH', 'DELETE'] as const;
type Method = (typeof methods)[number];

/** A route file as imported: handlers by method. */
export type RouteModule = Partial<Record<Method, unknown>>;

const isDescribed = (handler: unknown): handler is DescribedRoute => typeof handler === 'function' && 'heddleRoute' in handler;

const schemaOf = (schema: z.ZodType): z.core.JSONSchema.BaseSchema => z.toJSONSchema(schema, { io: 'input', unrepresentable: 'any', target: 'openapi-3.0' });

function parameters(schema: z.ZodType | undefined, place: 'path' | 'query'): unknown[] {
  if (!schema) return [];
  const { properties = {}, required = [] } = schemaOf(schema);
  return Object.entries(properties).map(([name, property]) => ({ name, in: place, required: place === 'path' || required.includes(name), schema: property }));
}

function operation(handler: DescribedRoute): Record<string, unknown> {
  const { params, query, body, status } = handler.description;
  const permission = permissions[handler.heddleRoute];
  return {
    summary: permission.description,
    description: `Roles: ${permission.roles.join(', ')}.${permission.grant ? ` Least grant on the portfolio: ${permission.grant}.` : ''}`,
    parameters: [...parameters(params, 'path'), ...parameters(query, 'query')],
    ...(body ? { requestBody: { required: true, content: { 'application/json': { schema: schemaOf(body) } } } } : {}),
    responses: {
      [String(status)]: { description: 'Done' },
      default: { description: 'A problem (RFC 9457)', content: { 'application/problem+json': { schema: { $ref: '#/components/schemas/Problem' } } } },
    },
  };
}

/** The OpenAPI document of the given routes, made from the very schemas by which requests are checked. */
export function describeApi(routes: Record<string, RouteModule>): Record<string, unknown> {
  const paths: Record<string, Record<string, unknown>> = {};
  for (const [path, module] of Object.entries(routes)) {
    for (const method of methods) {
      const handler = module[method];
      if (isDescribed(handler)) (paths[path] ??= {})[method.toLowerCase()] = operation(handler);
    }
  }
  return {
    openapi: '3.0.3',
    info: { title: 'Heddle', version: '1', description: 'JSON; ids are decimal strings, dates ISO 8601, null means no value. Lists are { items, total, page, pageSize }. Uploads are multipart/form-data with the files in the field "files".' },
    servers: [{ url: '/' }],
    security: [{ bearer: [] }, { session: [] }],
    paths,
    components: {
      securitySchemes: {
        bearer: { type: 'http', scheme: 'bearer', description: 'A token made on the account page' },
        session: { type: 'apiKey', in: 'cookie', name: 'next-auth.session-token', description: 'The session of a signed-in browser; unsafe methods need a same-origin Origin' },
      },
      schemas: {
        Problem: {
          type: 'object',
          required: ['type', 'title', 'status', 'detail', 'requestId'],
          properties: { type: { type: 'string' }, title: { type: 'string' }, status: { type: 'integer' }, detail: { type: 'string' }, requestId: { type: 'string' }, errors: { type: 'object', additionalProperties: { type: 'string' } } },
        },
      },
    },
  };
}
