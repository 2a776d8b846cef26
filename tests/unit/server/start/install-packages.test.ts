import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, it } from 'vitest';
import { arePackagesCurrent } from '../../../../server/start/install-packages.mjs';

let root: string;

beforeEach(() => {
  root = mkdtempSync(join(tmpdir(), 'spyhole-packages-'));
  mkdirSync(join(root, 'node_modules'));
});

afterEach(() => rmSync(root, { recursive: true, force: true }));

type Packages = Record<string, { version?: string; optional?: boolean }>;

function write(wanted: Packages, installed: Packages | null): void {
  writeFileSync(join(root, 'package-lock.json'), JSON.stringify({ packages: wanted }));
  if (installed === null) return;
  const path = join(root, 'node_modules/.package-lock.json');
  writeFileSync(path, JSON.stringify({ packages: installed }));
}

const CLAY = { 'node_modules/clay': { version: '1.2.0' } };

describe('arePackagesCurrent', () => {
  it('is satisfied by the same versions', () => {
    write({ '': {}, ...CLAY }, CLAY);
    expect(arePackagesCurrent(root)).toBe(true);
  });

  it('wants another version installed', () => {
    write({ '': {}, 'node_modules/clay': { version: '1.3.0' } }, CLAY);
    expect(arePackagesCurrent(root)).toBe(false);
  });

  it('wants a package that was added', () => {
    write({ '': {}, ...CLAY, 'node_modules/glaze': { version: '1.0.0' } }, CLAY);
    expect(arePackagesCurrent(root)).toBe(false);
  });

  it('does without a package that is meant for other machines', () => {
    const elsewhere = { 'node_modules/glaze-arm': { version: '1.0.0', optional: true } };
    write({ '': {}, ...CLAY, ...elsewhere }, CLAY);
    expect(arePackagesCurrent(root)).toBe(true);
  });

  it('takes an installation that was cut off for none at all', () => {
    write({ '': {}, ...CLAY }, null);
    expect(arePackagesCurrent(root)).toBe(false);
  });
});
