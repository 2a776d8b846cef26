import { describe, expect, it } from 'vitest';
import {
  explainLog,
  explainSystemError,
  StartFailure,
} from '../../../../server/start/start-failure.mjs';

describe('explainSystemError', () => {
  it('says that the disk is full, and where', () => {
    const error = Object.assign(new Error('ENOSPC: no space left on device, write'), {
      code: 'ENOSPC',
      path: '/srv/spyhole/.data/secrets.json',
    });
    expect(explainSystemError(error)).toEqual(
      new StartFailure('The disk is full: free some space and start again (/srv/spyhole/.data).'),
    );
  });

  it('passes on what it does not know', () => {
    const error = new Error('something else');
    expect(explainSystemError(error)).toBe(error);
  });
});

describe('explainLog', () => {
  it.each([
    'InnoDB: Error number 28 means "No space left on device"',
    'mariadbd: Error writing file \'./mysql/db.MAD\' (Errcode: 28 "No space left on device")',
  ])('knows a full disk from %s', (line) => {
    expect(explainLog(line)).toMatch(/^The disk is full/);
  });

  it('says nothing about a log without such words', () => {
    expect(explainLog('[Note] mariadbd: ready for connections.')).toBeNull();
  });
});
