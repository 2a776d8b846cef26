import { vi } from 'vitest';

export interface SentRequest {
  readonly method: string;
  readonly path: string;
  readonly body: unknown;
}
export interface FakeAnswer {
  readonly status: number;
  readonly body: unknown;
}
type Answers = Readonly<Record<string, FakeAnswer | ((sent: SentRequest) => FakeAnswer)>>;

/**
 * Puts answers in the place of the server for a page under test: "METHOD /path" → answer. A request
 * that has none fails the test that made it, as a refusal nobody expects.
 */
export function answerFetch(answers: Answers): SentRequest[] {
  const sent: SentRequest[] = [];
  vi.stubGlobal('fetch', (path: string, init: RequestInit = {}) => {
    const request: SentRequest = {
      method: init.method ?? 'GET',
      path,
      body: typeof init.body === 'string' ? (JSON.parse(init.body) as unknown) : undefined,
    };
    sent.push(request);
    const found = answers[`${request.method} ${path}`];
    const answer = typeof found === 'function' ? found(request) : found;
    if (!answer) throw new Error(`Nobody answers ${request.method} ${path}`);
    return Promise.resolve(
      new Response(JSON.stringify(answer.body), {
        status: answer.status,
        headers: { 'Content-Type': 'application/json' },
      }),
    );
  });
  return sent;
}

export const ok = (body: unknown): FakeAnswer => ({ status: 200, body });

/** A refusal as the server gives it. */
export function refused(
  status: number,
  code: string,
  title: string,
  more: object = {},
): FakeAnswer {
  return {
    status,
    body: {
      type: `https://example.org/problems/${code}`,
      code,
      title,
      status,
      detail: title,
      ...more,
    },
  };
}
