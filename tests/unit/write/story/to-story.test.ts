import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { EMPTY_STORY, storySchema, type Story } from '#shared/note/story.ts';
import { fromStory, toStory, type EditorNode } from '../../../../src/write/story/to-story.ts';

const paragraph = (text: string) => ({
  type: 'paragraph' as const,
  content: [{ type: 'text' as const, text }],
});
const NAME = '0123456789abcdef0123456789abcdef';

const whole: Story = {
  type: 'doc',
  content: [
    paragraph('Before'),
    { type: 'heading', attrs: { level: 3 }, content: [{ type: 'text', text: 'The stall' }] },
    {
      type: 'paragraph',
      content: [
        { type: 'text', text: 'bold', marks: [{ type: 'bold' }, { type: 'italic' }] },
        { type: 'hardBreak' },
        {
          type: 'text',
          text: 'link',
          marks: [{ type: 'link', attrs: { href: 'https://example.org/a' } }],
        },
      ],
    },
    {
      type: 'orderedList',
      attrs: { start: 4 },
      content: [
        {
          type: 'listItem',
          content: [
            paragraph('one'),
            { type: 'bulletList', content: [{ type: 'listItem', content: [paragraph('inner')] }] },
          ],
        },
      ],
    },
    { type: 'blockquote', content: [paragraph('said')] },
    { type: 'aside', attrs: { kind: 'change' }, content: [paragraph('insulate the floor')] },
    { type: 'picture', attrs: { name: NAME, alt: 'The kiln', caption: '' } },
    { type: 'horizontalRule' },
    paragraph('After'),
  ],
};

describe('the editor’s document as a story', () => {
  it('comes back the same from the editor’s form', () => {
    expect(toStory(fromStory(whole))).toEqual(whole);
    expect(storySchema.safeParse(whole).success).toBe(true);
    expect(toStory(fromStory(EMPTY_STORY))).toEqual(EMPTY_STORY);
  });

  it('drops attributes that the editor adds and a story does not have', () => {
    const doc: EditorNode = {
      type: 'doc',
      content: [
        { type: 'paragraph', attrs: { textAlign: null }, content: [{ type: 'text', text: 'a' }] },
        {
          type: 'orderedList',
          attrs: { start: 1, type: null },
          content: [{ type: 'listItem', attrs: { value: 3 }, content: [paragraph('x')] }],
        },
        {
          type: 'paragraph',
          content: [
            {
              type: 'text',
              text: 'here',
              marks: [
                {
                  type: 'link',
                  attrs: { href: 'https://example.org', target: '_blank', rel: null, class: null },
                },
              ],
            },
            { type: 'hardBreak', marks: [] },
          ],
        },
      ],
    };
    const story = toStory(doc);
    expect(storySchema.safeParse(story).success).toBe(true);
    expect(story.content[1]).toEqual({
      type: 'orderedList',
      content: [{ type: 'listItem', content: [paragraph('x')] }],
    });
    expect(story.content[2]?.content?.[0]).toEqual({
      type: 'text',
      text: 'here',
      marks: [{ type: 'link', attrs: { href: 'https://example.org' } }],
    });
  });

  it.each(['javascript:alert(1)', 'data:text/html,x', 'https://me@example.org', '//example.org'])(
    'keeps the words of a link to %s and not the link',
    (href) => {
      const story = toStory({
        type: 'doc',
        content: [
          {
            type: 'paragraph',
            content: [{ type: 'text', text: 'here', marks: [{ type: 'link', attrs: { href } }] }],
          },
        ],
      });
      expect(story.content).toEqual([paragraph('here')]);
    },
  );

  it('keeps the words of what a story has no place for', () => {
    const story = toStory({
      type: 'doc',
      content: [
        { type: 'codeBlock', content: [{ type: 'text', text: 'code' }] },
        { type: 'blockquote', content: [{ type: 'heading', content: [paragraph('h')] }] },
        { type: 'table', content: [{ type: 'row', content: [paragraph('cell')] }] },
      ],
    });
    expect(story.content).toEqual([
      paragraph('code'),
      { type: 'blockquote', content: [paragraph('h')] },
      paragraph('cell'),
    ]);
  });

  it('takes no picture by another name than the server’s, and keeps its words in one line', () => {
    const picture = (attrs: Record<string, unknown>) =>
      toStory({ type: 'doc', content: [{ type: 'picture', attrs }] }).content;
    expect(picture({ name: '../etc/passwd' })).toEqual([{ type: 'paragraph' }]);
    expect(picture({ name: NAME, alt: `a\u0000b\n${'x'.repeat(600)}`, caption: null })).toEqual([
      { type: 'picture', attrs: { name: NAME, alt: `ab${'x'.repeat(498)}`, caption: '' } },
    ]);
  });

  it('leaves out the empty paragraph the editor keeps at its end', () => {
    const doc: EditorNode = {
      type: 'doc',
      content: [{ type: 'horizontalRule' }, { type: 'paragraph' }],
    };
    expect(toStory(doc).content).toEqual([{ type: 'horizontalRule' }]);
    expect(toStory({ type: 'doc', content: [{ type: 'paragraph' }] })).toEqual(EMPTY_STORY);
  });

  it('cuts a very long run of text into pieces, never through a character', () => {
    const text = `${'a'.repeat(19_999)}😀${'b'.repeat(5)}`;
    const story = toStory({ type: 'doc', content: [paragraph(text)] });
    expect(storySchema.safeParse(story).success).toBe(true);
    const parts = (story.content[0]?.content ?? []).map((part) =>
      part.type === 'text' && 'text' in part ? part.text : '',
    );
    expect(parts.join('')).toBe(text);
    expect(parts[0]).toHaveLength(19_999);
  });

  it('is a story whatever the document holds, and then stays as it is', () => {
    const attrs = fc.dictionary(
      fc.constantFrom('level', 'start', 'kind', 'name', 'alt', 'href', 'class'),
      fc.oneof(fc.integer(), fc.string(), fc.constant(null), fc.constant(NAME)),
    );
    const marks = fc.array(
      fc.record({ type: fc.constantFrom('bold', 'italic', 'link', 'strike'), attrs }),
      { maxLength: 5 },
    );
    const types = fc.constantFrom(
      'paragraph',
      'heading',
      'bulletList',
      'orderedList',
      'listItem',
      'blockquote',
      'aside',
      'picture',
      'horizontalRule',
      'text',
      'hardBreak',
      'codeBlock',
    );
    const { node } = fc.letrec<{ node: EditorNode }>((tie) => ({
      node: fc.record(
        {
          type: types,
          attrs,
          marks,
          text: fc.string(),
          content: fc.array(tie('node'), { maxLength: 4, depthIdentifier: 'doc' }),
        },
        { requiredKeys: ['type'] },
      ),
    }));
    fc.assert(
      fc.property(fc.array(node, { maxLength: 6 }), (content) => {
        const story = toStory({ type: 'doc', content });
        expect(storySchema.safeParse(story).success).toBe(true);
        expect(toStory(fromStory(story))).toEqual(story);
      }),
      { numRuns: 300 },
    );
  });
});
