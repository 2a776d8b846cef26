import { z } from 'zod';
import { ProblemError } from '../http/client.ts';
import type { FieldIssue } from '../ui/field-issue.ts';

interface Fault {
  /** A JSON pointer into the body: "/email". */
  readonly pointer: string;
  readonly detail: string;
}

/** What is wrong with which field, said by the contract here or by the server. */
export function faultsOf(error: unknown): readonly Fault[] {
  if (error instanceof ProblemError) return error.problem.errors ?? [];
  if (error instanceof z.ZodError) {
    return error.issues.map(({ path, message }) => ({
      pointer: `/${path.map(String).join('/')}`,
      detail: message,
    }));
  }
  return [];
}

/** The faults of one field, as the fields show them. */
export function issuesAt(error: unknown, pointer: string): readonly FieldIssue[] {
  return faultsOf(error)
    .filter((fault) => fault.pointer === pointer)
    .map(({ detail }) => ({ kind: 'must-mend', text: detail }));
}

/** True for a refusal of this kind. */
export function isProblem(error: unknown, code: string): error is ProblemError {
  return error instanceof ProblemError && error.problem.code === code;
}
