import type { Role } from '#shared/vocabulary/statuses.ts';

export interface Visitor {
  readonly kind: 'visitor';
}
export interface SignedIn {
  readonly kind: 'member';
  readonly id: number;
  readonly name: string;
  readonly role: Role;
  readonly emailVerified: boolean;
  /** When the password was last typed in this session, epoch ms. */
  readonly confirmedAt: number;
}
/** Whoever asks. A suspended member is a visitor. */
export type Actor = Visitor | SignedIn;

export const VISITOR: Visitor = { kind: 'visitor' };
