import { idsOf } from './terms.ts';

export const NOTE_STATUSES = {
  draft: 'Draft',
  'handed-in': 'Handed in',
  'on-the-desk': 'On the desk',
  'sent-back': 'Sent back',
  published: 'Published',
  declined: 'Declined',
  'taken-down': 'Taken down',
} as const;
export type NoteStatus = keyof typeof NOTE_STATUSES;
export const NOTE_STATUS_IDS = idsOf(NOTE_STATUSES);

export const ROLES = { member: 'Member', moderator: 'Moderator', admin: 'Admin' } as const;
export type Role = keyof typeof ROLES;
export const ROLE_IDS = idsOf(ROLES);
