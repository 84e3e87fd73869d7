import http from 'node:http';
import { z } from 'zod';
import { answerApi, DroppedAnswer, type InFlight } from './api';
import { ApiError } from './api-error';
import { callControl, type Control } from './control';
import { answerPage } from './pages/answer-page';
import type { Runtime } from './runtime';

const LARGEST_BODY = 1_000_000;
const loopback = /^(127\.0\.0\.1|localhost)(:\d+)?$/;

const pageHeaders = {
  'content-type': 'text/html; charset=utf-8',
  'cache-control': 'no-store',
  'content-security-policy':
    "default-src 'none'; style-src 'unsafe-inline'; base-uri 'none'; frame-ancestors 'none'",
  'referrer-policy': 'no-referrer',
  'x-content-type-options': 'nosniff',
};

async function readBody(request: http.IncomingMessage): Promise<string> {
  const parts: Buffer[] = [];
  let size = 0;
  for await (const part of request) {
    const bytes = Buffer.from(part as Uint8Array);
    size += bytes.length;
    if (size > LARGEST_BODY)
      throw new ApiError(413, { type: 'invalid_request_error', message: 'The body is too large.' });
    parts.push(bytes);
  }
  return Buffer.concat(parts).toString('utf8');
}

function send(
  answer: http.ServerResponse,
  status: number,
  headers: Record<string, string>,
  body: string,
): void {
  answer.writeHead(status, { ...headers, 'content-length': String(Buffer.byteLength(body)) });
  answer.end(body);
}

const sendJson = (
  answer: http.ServerResponse,
  status: number,
  value: unknown,
  headers: Record<string, string> = {},
) =>
  send(
    answer,
    status,
    { 'content-type': 'application/json', ...headers },
    JSON.stringify(value ?? null, null, 2),
  );

async function controlOver(
  control: Control,
  request: http.IncomingMessage,
  name: string,
  answer: http.ServerResponse,
) {
  // A page in a browser can't send JSON elsewhere without being asked first, and nobody answers that question here.
  if (request.method !== 'POST' || request.headers['content-type']?.startsWith('application/json') !== true) {
    return sendJson(answer, 405, { error: { message: 'POST with application/json.' } });
  }
  try {
    const text = await readBody(request);
    const input: unknown = text === '' ? {} : JSON.parse(text);
    return sendJson(answer, 200, await callControl(control, name, input));
  } catch (error) {
    if (error instanceof ApiError) return sendJson(answer, error.status, { error: error.body });
    if (error instanceof z.ZodError)
      return sendJson(answer, 400, { error: { message: z.prettifyError(error) } });
    if (error instanceof SyntaxError) return sendJson(answer, 400, { error: { message: 'No JSON.' } });
    throw error;
  }
}

/** The HTTP side: the API under /v1, the controls under /_control, pages for people elsewhere. */
export function createServer(runtime: Runtime, control: Control): http.Server {
  const inFlight: InFlight = new Set();

  async function answerRequest(request: http.IncomingMessage, answer: http.ServerResponse): Promise<void> {
    const { pathname, search } = new URL(request.url ?? '/', 'http://127.0.0.1');
    const method = request.method ?? 'GET';
    // Another name for this machine would let a web page elsewhere read the answers.
    if (!loopback.test(request.headers.host ?? '')) {
      return sendJson(answer, 421, { error: { message: 'This server answers on 127.0.0.1 only.' } });
    }
    if (pathname.startsWith('/_control/')) {
      return controlOver(control, request, pathname.slice('/_control/'.length), answer);
    }
    if (pathname.startsWith('/v1/')) {
      const body = await readBody(request);
      const call = { method, path: pathname, query: search.slice(1), headers: request.headers, body };
      const { status, headers, body: text } = await answerApi(runtime, inFlight, call);
      return send(answer, status, { 'content-type': 'application/json', ...headers }, text);
    }
    if (pathname === '/favicon.ico') return send(answer, 204, {}, '');
    if (method !== 'GET' && method !== 'HEAD' && method !== 'POST') return send(answer, 405, {}, '');
    const form = method === 'POST' ? new URLSearchParams(await readBody(request)) : null;
    const page = answerPage(runtime, pathname, form);
    const headers = page.location === undefined ? pageHeaders : { ...pageHeaders, location: page.location };
    return send(answer, page.status, headers, page.body);
  }

  return http.createServer((request, answer) => {
    answerRequest(request, answer).catch((error: unknown) => {
      if (error instanceof DroppedAnswer) return void request.socket.destroy();
      if (!(error instanceof ApiError)) console.error(error);
      if (answer.headersSent) return void request.socket.destroy();
      const status = error instanceof ApiError ? error.status : 500;
      sendJson(answer, status, {
        error: { type: 'api_error', message: 'The local server failed; see its log.' },
      });
    });
  });
}
