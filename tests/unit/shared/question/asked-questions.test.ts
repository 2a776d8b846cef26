import { describe, expect, test } from 'vitest';
import { readQuestion } from '#shared/question/read-question.ts';
import { askedQuestions, shortReading } from '../../../support/asked-questions/asked-questions.ts';

/** What is to be read was written by hand, from the rules of reading, before any was tried. */
describe.each(['asked-questions', 'more-questions', 'late-questions'])(
  'each question of the table %s is read as a potter means it',
  (name) => {
    test.each(askedQuestions(name))('$question', ({ question, expected }) => {
      expect(shortReading(readQuestion(question), expected)).toBe(expected);
    });
  },
);
