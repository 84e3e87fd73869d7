import 'server-only';
import type { Contract, FileAnswer } from '@/lib/contracts/contract';
import { configuration } from '@/lib/services/configuration';
import { findPerson } from '@/lib/services/sign-in';
import { perform } from '@/lib/use-cases/perform';
import { Refusal } from '@/lib/use-cases/refusal';
import type { UseCase } from '@/lib/use-cases/world';
import { problemResponse } from './problems';

/** Uploads end here; JSON bodies are far smaller. */
const MOST_BODY_BYTES = 20 * 1024 * 1024;

type RouteContext = { params: Promise<Record<string, string | string[]>> };

/** Binds a use case to a route: contract in, use case, contract out; everything refused becomes a problem document. */
export function handle<C extends Contract>(useCase: UseCase<C>) {
  const route = async (request: Request, context: RouteContext): Promise<Response> => {
    try {
      refuseForeignOrigin(request);
      const person = await findPerson(request.headers);
      const answer: unknown = await perform(
        useCase,
        { person, idempotencyKey: request.headers.get('idempotency-key') ?? undefined },
        {
          params: await context.params,
          query: Object.fromEntries(new URL(request.url).searchParams),
          readBody: () => readBody(request, useCase.contract),
        },
      );
      return useCase.contract.produces ? fileResponse(answer as FileAnswer) : jsonResponse(answer);
    } catch (error) {
      return problemResponse(error);
    }
  };
  // The every-route test finds the contract of a route here.
  return Object.assign(route, { contract: useCase.contract });
}

/** A browser says where a write comes from; other sites may not write in a person's name. */
function refuseForeignOrigin(request: Request): void {
  if (request.method === 'GET') return;
  const origin = request.headers.get('origin');
  if (origin && origin !== configuration().appUrl) {
    throw new Refusal('not_allowed', 'This request comes from another site.');
  }
}

async function readBody(request: Request, contract: Contract): Promise<unknown> {
  if (request.method === 'GET' || request.method === 'DELETE') return undefined;
  if (Number(request.headers.get('content-length') ?? 0) > MOST_BODY_BYTES) {
    throw new Refusal('too_large', 'This is larger than 20 MB.');
  }
  if (contract.consumes === 'multipart/form-data') {
    const form = await request.formData().catch(() => {
      throw new Refusal('malformed', 'The form could not be read.');
    });
    return Object.fromEntries(form);
  }
  const text = await request.text();
  if (text === '') return undefined;
  try {
    return JSON.parse(text);
  } catch {
    throw new Refusal('malformed', 'The body is not JSON.');
  }
}

function jsonResponse(answer: unknown): Response {
  return Response.json(answer, { headers: { 'cache-control': 'no-store' } });
}

function fileResponse(file: FileAnswer): Response {
  const name = encodeURIComponent(file.fileName);
  return new Response(file.body, {
    headers: {
      'content-type': file.contentType,
      'content-disposition': `${file.inline ? 'inline' : 'attachment'}; filename*=UTF-8''${name}`,
      'cache-control': file.keepSeconds ? `private, max-age=${file.keepSeconds}` : 'no-store',
      'content-security-policy': "default-src 'none'; style-src 'unsafe-inline'; sandbox",
    },
  });
}
