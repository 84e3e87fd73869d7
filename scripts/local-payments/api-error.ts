export interface ErrorBody {
  type: 'api_error' | 'card_error' | 'idempotency_error' | 'invalid_request_error';
  message: string;
  code?: string;
  decline_code?: string;
  param?: string;
  charge?: string;
  payment_intent?: unknown;
}

/** An answer of the API that is not a success. */
export class ApiError extends Error {
  override name = 'ApiError';

  constructor(
    readonly status: number,
    readonly body: ErrorBody,
    /** Whether the work had begun: such an answer is kept for its idempotency key, a failed validation is not. */
    readonly hasExecuted = false,
    readonly headers: Readonly<Record<string, string>> = {},
  ) {
    super(body.message);
  }
}

/** A parameter that is missing or malformed. */
export function invalid(message: string, param?: string, code?: string): ApiError {
  return new ApiError(400, {
    type: 'invalid_request_error',
    message,
    ...(param === undefined ? {} : { param }),
    ...(code === undefined ? {} : { code }),
  });
}

/** A well-formed request that the object's state does not allow. */
export function refused(message: string, code?: string, param?: string): ApiError {
  return new ApiError(400, invalid(message, param, code).body, true);
}

export function missing(kind: string, id: string, param = 'id'): ApiError {
  return new ApiError(404, {
    type: 'invalid_request_error',
    code: 'resource_missing',
    message: `No such ${kind}: '${id}'`,
    param,
  });
}
