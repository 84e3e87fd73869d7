/** Why something that a person asked for is not done: a closed set, mapped to problem documents by `lib/api/problems.ts`. */
export type RefusalCode =
  | 'signed_out'
  | 'not_found'
  | 'not_allowed'
  | 'invalid'
  | 'malformed'
  | 'stale'
  | 'already_exists'
  | 'wrong_state'
  | 'period_closed'
  | 'key_missing'
  | 'key_reused'
  | 'unsupported_file'
  | 'too_large'
  | 'too_many_requests'
  | 'payment_service_unavailable';

export interface FieldError {
  /** Path in the body with dots, such as "hatchlings.2.code". */
  field: string;
  message: string;
}

export class Refusal extends Error {
  override name = 'Refusal';
  constructor(
    readonly code: RefusalCode,
    /** One sentence for the person: what is the matter, and what can be done. */
    readonly detail: string,
    readonly more: { errors?: FieldError[]; currentVersion?: number } = {},
  ) {
    super(detail);
  }
}

export const notFound = (what: string) =>
  new Refusal('not_found', `There is no such ${what} here, or you may not see it.`);

export const invalid = (field: string, message: string) =>
  new Refusal('invalid', message, { errors: [{ field, message }] });

/** An edit was made on version `seen`, but somebody saved `current` in the meantime. */
export const stale = (what: string, current: number) =>
  new Refusal(
    'stale',
    `Somebody changed this ${what} while you were editing. Nothing of yours was saved; look at the new version and try again.`,
    {
      currentVersion: current,
    },
  );
