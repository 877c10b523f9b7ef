import { ExpectedError } from '@/lib/errors';

/** application/problem+json (RFC 9457). An unexpected error says nothing of its inside, only the id under which it was logged. */
export function problemResponse(error: unknown, requestId: string): Response {
  const expected = error instanceof ExpectedError ? error : null;
  const body = expected
    ? { type: `about:blank#${expected.code}`, title: expected.title, status: expected.status, detail: expected.message, requestId, ...expected.extra }
    : { type: 'about:blank#unexpected', title: 'Unexpected error', status: 500, detail: 'Something went wrong on our side. Nothing was changed by this request. Tell your administrator the request id.', requestId };
  return Response.json(body, {
    status: body.status,
    headers: { 'Content-Type': 'application/problem+json', 'X-Request-Id': requestId, 'Cache-Control': 'no-store', ...expected?.headers },
  });
}
