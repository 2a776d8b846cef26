import { readFileSync } from 'node:fs';
import path from 'node:path';
import { FAMILY_OF_FORM } from '#shared/vocabulary/ware.ts';
import { demo } from '../../../seeds/development/demo.ts';
import type { FiringTold } from '../../../seeds/development/firings/firing.ts';
import type { Grade } from './ranking-measures.ts';

export interface JudgedQuestion {
  readonly question: string;
  /** By the key of the demo's firing; those that are not named have grade 0. */
  readonly grades: ReadonlyMap<string, Grade>;
}

interface Told extends FiringTold {
  /** The next published firing of the same kiln. */
  readonly next: FiringTold | undefined;
}

const published = demo.firings.filter(({ status }) => status === 'published');
const notes: readonly Told[] = published.map(({ told, kilnKey }, index) => ({
  ...told,
  next: published.slice(index + 1).find((later) => later.kilnKey === kilnKey)?.told,
}));
/** Titles of the demo's published notes by key: what a search returns is told by its title. */
export const titleByKey: ReadonlyMap<string, string> = new Map(
  notes.map(({ key, title }) => [key, title]),
);

type Test = (note: Told) => boolean;
const within = (value: number | undefined, [low, high]: readonly [number, number]): boolean =>
  value !== undefined && value >= low && value <= high;

/** `stall@680-720`, `sag@700-750`, `reach@0-30`: what the author says, in °C or minutes. */
function measured(name: string, range: readonly [number, number]): Test {
  if (name === 'stall') return ({ says }) => within(says?.stallCelsius, range);
  if (name === 'sag') {
    return ({ climb, troubles }) =>
      troubles?.includes('sag') === true &&
      (climb.gusts ?? []).some(({ from }) => within(from, range));
  }
  return ({ climb }) => within(climb.reach, range);
}

/** A note has a word if it is its key, a trouble, cause or change it names, a form or a glaze. */
function wordsOf(note: FiringTold): ReadonlySet<string> {
  const pieces = note.pieces.flatMap(({ form, glazeFamily, cracked }) => [
    form ? FAMILY_OF_FORM[form] : '',
    glazeFamily ?? '',
    cracked ? 'cracked' : '',
  ]);
  const changes = (note.changes ?? []).map(([change]) => change);
  return new Set([
    note.key,
    ...(note.troubles ?? []),
    ...(note.causes ?? []),
    ...changes,
    ...pieces,
  ]);
}

/** The trouble was there, and is no longer told of in the next firing of the kiln. */
function wasCured(note: Told, asked: readonly string[]): boolean {
  const { troubles = [], next } = note;
  const about = troubles.filter((trouble) => asked.includes(trouble));
  const sought = about.length > 0 ? about : troubles;
  return (
    sought.length > 0 && next !== undefined && !sought.some((it) => next.troubles?.includes(it))
  );
}

function testOf(word: string, asked: readonly string[]): Test {
  if (word === 'cured') return (note) => wasCured(note, asked);
  if (word.startsWith('!')) return (note) => !wordsOf(note).has(word.slice(1));
  const [, name, low, high] = /^(stall|sag|reach)@(\d+)-(\d+)$/.exec(word) ?? [];
  if (name !== undefined) return measured(name, [Number(low), Number(high)]);
  return (note) => wordsOf(note).has(word);
}

/** `stall@680-720 cured; key`: notes that pass every word of one of the parts. */
function notesOf(selectors: string): Told[] {
  const parts = selectors.split(';').map((part) => part.trim().split(' '));
  const found = parts.flatMap((words) => {
    const asked = words.map((word) => word.replace(/@.*/, ''));
    const chosen = notes.filter((note) => words.every((word) => testOf(word, asked)(note)));
    if (chosen.length === 0) throw new Error(`"${words.join(' ')}" is no note of the demo.`);
    return chosen;
  });
  return found;
}

function gradesOf(judgements: readonly string[]): Map<string, Grade> {
  const grades = new Map<string, Grade>();
  for (const judgement of judgements) {
    const grade = Number(judgement.trim()[0]) as Grade;
    for (const { key } of notesOf(judgement.trim().slice(1))) {
      if ((grades.get(key) ?? 0) < grade) grades.set(key, grade);
    }
  }
  return grades;
}

/** The questions of `judged-questions.txt`; throws where one judges a note that the demo lacks. */
export function judgedQuestions(): JudgedQuestion[] {
  const text = readFileSync(path.join(import.meta.dirname, 'judged-questions.txt'), 'utf8');
  return text
    .split('\n')
    .filter((line) => line !== '' && !line.startsWith('#'))
    .map((line) => {
      const [question = '', ...judgements] = (line.split(' #')[0] ?? '').split(' | ');
      return { question: question.trim(), grades: gradesOf(judgements) };
    });
}
