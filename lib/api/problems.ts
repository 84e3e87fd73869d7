import 'server-only';
import type { Problem } from '@/lib/contracts/problem';
import { log } from '@/lib/services/log';
import { Refusal, type RefusalCode } from '@/lib/use-cases/refusal';

const kinds: Record<RefusalCode, { status: number; title: string }> = {
  signed_out: { status: 401, title: 'Not signed in' },
  not_found: { status: 404, title: 'Not found' },
  not_allowed: { status: 403, title: 'Not allowed' },
  invalid: { status: 422, title: 'Something is not right' },
  malformed: { status: 400, title: 'Not readable' },
  stale: { status: 409, title: 'Changed in the meantime' },
  already_exists: { status: 409, title: 'Already there' },
  wrong_state: { status: 409, title: 'Not possible now' },
  period_closed: { status: 409, title: 'The period is closed' },
  key_missing: { status: 400, title: 'Idempotency-Key missing' },
  key_reused: { status: 422, title: 'Idempotency-Key reused' },
  unsupported_file: { status: 415, title: 'This kind of file is not taken' },
  too_large: { status: 413, title: 'Too large' },
  too_many_requests: { status: 429, title: 'Too many requests' },
  payment_service_unavailable: { status: 503, title: 'The payment service does not answer' },
};

/** The problem document (RFC 9457) for anything that was thrown; what is nobody's doing is logged and says little. */
function describeProblem(error: unknown): Problem {
  if (error instanceof Refusal) {
    const { status, title } = kinds[error.code];
    return {
      type: `/problems/${error.code.replaceAll('_', '-')}`,
      title,
      status,
      detail: error.detail,
      errors: error.more.errors ?? [],
      ...(error.more.currentVersion === undefined ? {} : { currentVersion: error.more.currentVersion }),
    };
  }
  log.error({ err: error }, 'unexpected');
  return {
    type: '/problems/unexpected',
    title: 'Something went wrong here',
    status: 500,
    detail:
      'This is our fault, not yours. Nothing was saved. Try again; if it stays, tell the owner of the workspace.',
    errors: [],
  };
}

export function problemResponse(error: unknown): Response {
  const document = describeProblem(error);
  return new Response(JSON.stringify(document), {
    status: document.status,
    headers: { 'content-type': 'application/problem+json', 'cache-control': 'no-store' },
  });
}
