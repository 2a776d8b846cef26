export type ErrorBody = { message: string; code: string; type: string; link: string };

/** Status of every code that is not a plain 400. */
const STATUS_BY_CODE: Record<string, number> = {
  missing_authorization_header: 401,
  invalid_api_key: 403,
  index_not_found: 404,
  document_not_found: 404,
  task_not_found: 404,
  api_key_not_found: 404,
  index_already_exists: 409,
  api_key_already_exists: 409,
  payload_too_large: 413,
  missing_content_type: 415,
  invalid_content_type: 415,
  internal: 500,
};

/** An error with a code of the protocol; the HTTP layer and the task list show its four fields. */
export class EngineError extends Error {
  readonly code: string;

  constructor(code: string, message: string) {
    super(message);
    this.name = 'EngineError';
    this.code = code;
  }
}

export function statusOf(code: string): number {
  return STATUS_BY_CODE[code] ?? 400;
}

export function errorBody(error: EngineError): ErrorBody {
  const status = statusOf(error.code);
  const type =
    status === 401 || error.code === 'invalid_api_key'
      ? 'auth'
      : status >= 500
        ? 'internal'
        : 'invalid_request';
  return {
    message: error.message,
    code: error.code,
    type,
    link: `https://docs.meilisearch.com/errors#${error.code}`,
  };
}

/** Unknown failures are shown as `internal`, without their inner message. */
export function toEngineError(error: unknown): EngineError {
  if (error instanceof EngineError) return error;
  return new EngineError('internal', 'An internal error has occurred.');
}

export function indexNotFound(uid: string): EngineError {
  return new EngineError('index_not_found', `Index \`${uid}\` not found.`);
}
