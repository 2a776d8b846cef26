import { storyTexts } from '../story.ts';
import type { StoryText } from '../story.ts';
import { unsafePassages } from '../unsafe-words.ts';
import { mustMend } from './check.ts';
import type { Check, CheckContext } from './check.ts';

/** Words on each side of a passage that the desk is shown. */
const CONTEXT_CHARACTERS = 40;

/** Title, story, pictures' alt texts, and the cautions. */
export function storyChecks({ fields }: CheckContext): Check[] {
  const checks: Check[] = [];
  if (fields.title.trim() === '') {
    checks.push(mustMend('title-missing', '/title', 'Give the note a title.'));
  }
  if (!storyTexts(fields.story).some(({ kind }) => kind !== 'caption' && kind !== 'heading')) {
    checks.push(
      mustMend('story-missing', '/story', 'Tell how it went, in a sentence or two at least.'),
    );
  }
  fields.story.content.forEach(({ type, attrs }, index) => {
    if (type !== 'picture') return;
    const alt = attrs?.['alt'];
    if (typeof alt === 'string' && alt.trim() !== '') return;
    checks.push(
      mustMend(
        'picture-without-alt',
        `/story/content/${String(index)}/attrs/alt`,
        'A picture has no description. Say what it shows, for those who cannot see it.',
      ),
    );
  });
  if (!fields.cautionsRead) {
    checks.push(
      mustMend(
        'cautions-not-read',
        '/cautionsRead',
        'Read the cautions, and tick that you have: others will fire by your note.',
      ),
    );
  }
  return checks;
}

interface PointedText extends StoryText {
  readonly pointer: string;
}

/** Words that suggest a dangerous practice, wherever in the note they stand: for the desk only. */
export function unsafePracticeChecks({ fields }: CheckContext): Check[] {
  const texts: PointedText[] = [
    { pointer: '/title', kind: 'heading', text: fields.title },
    ...storyTexts(fields.story).map((text) => ({ ...text, pointer: '/story' })),
    { pointer: '/result/surprised', kind: 'text', text: fields.result.surprised },
    { pointer: '/result/nextTime', kind: 'change', text: fields.result.nextTime },
    ...fields.changes.map(({ purpose }, row): PointedText => ({
      pointer: `/changes/${String(row)}/purpose`,
      kind: 'text',
      text: purpose,
    })),
    ...fields.pieces.map(({ remark }, row): PointedText => ({
      pointer: `/pieces/${String(row)}/remark`,
      kind: 'text',
      text: remark,
    })),
  ];
  return unsafePassages(texts).map(({ blockIndex, from, to, reason }): Check => {
    const { text, pointer } = texts[blockIndex] ?? { text: '', pointer: '/story' };
    const start = Math.max(0, from - CONTEXT_CHARACTERS);
    const end = Math.min(text.length, to + CONTEXT_CHARACTERS);
    const quoted = `${start > 0 ? '…' : ''}${text.slice(start, end).trim()}${end < text.length ? '…' : ''}`;
    return {
      code: 'unsafe-practice',
      kind: 'look-again',
      pointer,
      text: `${reason} “${quoted.replace(/\s+/g, ' ')}”`,
      forModerators: true,
    };
  });
}
