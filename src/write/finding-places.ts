import type { Finding, FindingCode } from '#shared/firing/findings.ts';

/** The field beside which a finding is told while the author types. */
const PLACES: Readonly<Partial<Record<FindingCode, string>>> = {
  reached: '/plan/timeToTemperatureMinutes',
  'slow-climb': '/plan/timeToTemperatureMinutes',
  'not-reached': '/plan/peakBy',
  overshoot: '/plan/peakBy',
  'just-short': '/plan/peakBy',
  hold: '/plan/holdKeptMinutes',
  stall: '/result/troubles',
  sag: '/result/troubles',
  'uneven-heat': '/result/troubles',
};

/** The field beside which a finding is told, if any. */
export function placeOfFinding({ code }: Finding): string | null {
  return PLACES[code] ?? null;
}

/** The findings told beside the field at a pointer. */
export function findingsBeside(pointer: string, findings: readonly Finding[]): Finding[] {
  return findings.filter((finding) => placeOfFinding(finding) === pointer);
}
