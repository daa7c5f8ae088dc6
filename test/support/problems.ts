import type { Answer } from './api-client';

/** What every refusal looks like, whole: anything more in the answer would be a leak, anything less a broken promise. */
export function problemOf(kind: string, status: number, detail: string, more: Record<string, unknown> = {}): Record<string, unknown> {
  return {
    type: `/problems/${kind}`,
    title: expect.any(String),
    status,
    detail,
    instance: expect.stringMatching(/^\/api\//),
    requestId: expect.stringMatching(/^[0-9a-f-]{36}$/),
    ...more,
  };
}

export function expectProblem(answer: Answer, problem: Record<string, unknown>): void {
  expect({ status: answer.status, body: answer.json }).toEqual({ status: problem['status'], body: problem });
  expect(answer.headers.get('content-type')).toBe('application/problem+json; charset=utf-8');
}

export function expectInvalid(answer: Answer, errors: readonly { pointer: string; detail: string }[]): void {
  const count = errors.length === 1 ? '1 value is not valid.' : `${errors.length} values are not valid.`;
  expectProblem(answer, problemOf('invalid-input', 422, count, { errors }));
}

export const expectNotFound = (answer: Answer, noun: string): void =>
  expectProblem(answer, problemOf('not-found', 404, `There is no such ${noun}.`));

export const expectNotSignedIn = (answer: Answer, detail = 'Sign in, or send a personal token.'): void =>
  expectProblem(answer, problemOf('not-signed-in', 401, detail));

export const expectNotAllowed = (answer: Answer, detail: string): void => expectProblem(answer, problemOf('not-allowed', 403, detail));
