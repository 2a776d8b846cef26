import type { Trouble } from '../vocabulary/troubles.ts';
import type { QuestionReading } from './reading-types.ts';

/** Troubles whose temperature is measured, so that nearness says more than the same number. */
const MEASURED_LEVELS: readonly Trouble[] = ['stall', 'sag', 'overshoot'];

/**
 * What authors may have put into the same words: the cone, the material of the smoke, and the number
 * of a temperature that no record tells of ("cracked between 540 and 600"). The engine leaves out the
 * last words of a text first, so what tells most stands first.
 */
export function typedTexts({ q, parts, trouble }: QuestionReading): string {
  const measured = trouble.some((kind) => MEASURED_LEVELS.includes(kind));
  const texts = parts.flatMap((part) => {
    const typed = q.slice(...part.span).toLowerCase();
    if (part.kind === 'cone') return [`${part.value} cone`];
    if (part.kind === 'cause' && part.value === 'smoke-material') {
      return typed.match(/\p{L}{3,}/gu) ?? [];
    }
    return part.kind === 'temperature' && !measured ? (typed.match(/\d{2,}/g) ?? []) : [];
  });
  return texts.join(' ');
}
