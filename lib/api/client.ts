/**
 * How the browser speaks to the API. Every answer that is not a success becomes an ApiProblem, whatever went wrong on the way,
 * so that pages have one kind of error with words that can be shown.
 */

/** application/problem+json of the API, or what stands in for it when no such answer came. */
export class ApiProblem extends Error {
  constructor(
    readonly status: number,
    readonly title: string,
    detail: string,
    /** Messages by field path. */
    readonly errors: Record<string, string> = {},
    readonly requestId: string | null = null,
  ) {
    super(detail);
    this.name = 'ApiProblem';
  }
}

const unreachable = () => new ApiProblem(0, 'No answer', 'The service could not be reached. Nothing is lost; check the connection and try again.');

/** The problem that an answer carries. */
export function problemOf(status: number, text: string): ApiProblem {
  try {
    const body = JSON.parse(text) as { title?: string; detail?: string; errors?: Record<string, string>; requestId?: string };
    if (typeof body.detail === 'string') return new ApiProblem(status, body.title ?? 'Problem', body.detail, body.errors ?? {}, body.requestId ?? null);
  } catch (error) {
    if (!(error instanceof SyntaxError)) throw error;
  }
  return new ApiProblem(status, 'Unexpected answer', `The service answered with status ${status} and without an explanation. Try again; nothing was lost.`);
}

/** Sends a request and gives the parsed answer, or undefined where there is none. */
export async function send<Result>(method: 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE', path: string, body?: unknown, signal?: AbortSignal): Promise<Result> {
  let response: Response;
  try {
    response = await fetch(path, { method, signal, ...(body === undefined ? {} : { headers: { 'Content-Type': 'application/json' }, body: JSON.stringify(body) }) });
  } catch (error) {
    if (error instanceof DOMException && error.name === 'AbortError') throw error;
    throw unreachable();
  }
  const text = await response.text();
  if (!response.ok) throw problemOf(response.status, text);
  return (text === '' ? undefined : JSON.parse(text)) as Result;
}

/** The fetcher of every SWR hook. */
export const fetchJson = <Result>(path: string): Promise<Result> => send<Result>('GET', path);

/** Words for the head of a form: where the service names fields, those carry the messages. */
export function formMessage(problem: ApiProblem | string): string {
  if (typeof problem === 'string') return problem;
  return problem.message.startsWith('The body cannot be used') ? 'Nothing was saved yet. Look at the marked fields.' : problem.message;
}

/** Words for any error that an event handler caught. */
export function messageOf(error: unknown): string {
  return error instanceof ApiProblem ? error.message : 'Something went wrong in this page. Nothing is lost; load it again.';
}

interface UploadOptions {
  onProgress: (sent: number, total: number) => void;
  signal?: AbortSignal;
}

/** Sends files as multipart/form-data; through XMLHttpRequest, because fetch tells nothing of how much was sent. */
export function sendFiles<Result>(path: string, files: readonly File[], fields: Record<string, string>, { onProgress, signal }: UploadOptions): Promise<Result> {
  const form = new FormData();
  // Fields first: the service reads the body as a stream and must know them before the files come.
  for (const [name, value] of Object.entries(fields)) form.append(name, value);
  for (const file of files) form.append('files', file, file.name);
  return new Promise((resolve, reject) => {
    const request = new XMLHttpRequest();
    request.open('POST', path);
    request.upload.addEventListener('progress', (event) => {
      if (event.lengthComputable) onProgress(event.loaded, event.total);
    });
    request.addEventListener('load', () => {
      if (request.status >= 200 && request.status < 300) resolve(JSON.parse(request.responseText) as Result);
      else reject(problemOf(request.status, request.responseText));
    });
    request.addEventListener('error', () => reject(unreachable()));
    request.addEventListener('abort', () => reject(new ApiProblem(0, 'Stopped', 'The upload was stopped. Nothing of it was kept.')));
    signal?.addEventListener('abort', () => request.abort());
    request.send(form);
  });
}
