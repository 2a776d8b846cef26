import { describe, expect, it } from 'vitest';
import {
  isContention,
  isDuplicate,
  isUnreachable,
} from '../../../../server/database/constraint-errors.ts';

function refused(sqlMessage: string): unknown {
  return Object.assign(new Error(sqlMessage), { code: 'ER_DUP_ENTRY', errno: 1062, sqlMessage });
}

describe('isDuplicate', () => {
  it('reads the index with or without its table before it', () => {
    const plain = refused("Duplicate entry 'ida' for key 'members_name_key_unique'");
    const long = refused("Duplicate entry 'ida' for key 'members.members_name_key_unique'");
    expect(isDuplicate(plain, 'members_name_key_unique')).toBe(true);
    expect(isDuplicate(long, 'members_name_key_unique')).toBe(true);
  });

  it('is not misled by a value that looks like the end of the message', () => {
    const error = refused("Duplicate entry 'x' for key 'other'' for key 'members_email_unique'");
    expect(isDuplicate(error, 'members_email_unique')).toBe(true);
    expect(isDuplicate(error, 'other')).toBe(false);
  });

  it.each([null, undefined, 'text', new Error('no code')])('is false for %s', (error) => {
    expect(isDuplicate(error, 'members_email_unique')).toBe(false);
  });
});

describe('isContention', () => {
  it.each([1213, 1205, 1020])('is true for error %i', (errno) => {
    expect(isContention({ errno })).toBe(true);
  });

  it('is false for a duplicate', () => {
    expect(isContention({ errno: 1062 })).toBe(false);
  });
});

describe('isUnreachable', () => {
  it('is true when the pool has no connection to give in time', () => {
    const error = new Error('Timeout acquiring a connection');
    error.name = 'KnexTimeoutError';
    expect(isUnreachable(error)).toBe(true);
  });

  it.each(['ECONNREFUSED', 'PROTOCOL_CONNECTION_LOST'])('is true for %s', (code) => {
    expect(isUnreachable({ code })).toBe(true);
  });

  it('is true when the disk of the database is full', () => {
    expect(isUnreachable({ errno: 1021 })).toBe(true);
  });

  it('is false for a mistake in a statement', () => {
    expect(isUnreachable({ code: 'ER_PARSE_ERROR', errno: 1064 })).toBe(false);
  });
});
