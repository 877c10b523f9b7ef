import { readHealth } from '@/lib/access/health';

/** Outside the wrapper: balancers and the start script have no account. */
export const publicRoute = 'health: database, worker, queue';

export const dynamic = 'force-dynamic';

export async function GET(): Promise<Response> {
  const health = await readHealth();
  return Response.json(health, { status: health.status === 'ok' ? 200 : 503, headers: { 'Cache-Control': 'no-store' } });
}
