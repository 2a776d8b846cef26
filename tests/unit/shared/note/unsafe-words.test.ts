import { describe, expect, it } from 'vitest';
import type { StoryText } from '#shared/note/story.ts';
import { unsafePassages } from '#shared/note/unsafe-words.ts';

const practicesIn = (text: string, kind: StoryText['kind'] = 'text'): string[] => [
  ...new Set(unsafePassages([{ kind, text }]).map((passage) => passage.practice)),
];

describe('unsafe words', () => {
  it.each([
    ['gas-before-flame', 'I turned the gas on and then held a match to the port.'],
    ['gas-before-flame', 'Gas on before the flame, as always.'],
    ['gas-before-flame', 'We let the gas run for a few seconds before lighting it.'],
    ['relit-hot-or-unaired', 'It went out at 800, so we relit it straight away.'],
    ['relit-hot-or-unaired', 'The flame died and I relit it off the glowing walls.'],
    ['relit-hot-or-unaired', 'I did not air the chamber before relighting.'],
    ['relit-hot-or-unaired', 'Relit without opening the lid.'],
    ['indoors', 'It rained, so we fired in the garage with the door open.'],
    ['indoors', 'The kiln stood inside a big white tent.'],
    ['indoors', 'We fired indoors for once.'],
    ['left-alone', 'I left the kiln alone for half an hour.'],
    ['left-alone', 'The burner was steady, so I left it running unattended.'],
    ['left-alone', 'We went in for lunch with the kiln still running.'],
    ['no-mask-in-smoke', 'A lot of smoke and no mask.'],
    ['no-mask-in-smoke', 'I lifted the bin without a respirator.'],
    ['heat-on-the-cylinder', 'Frost on the gas bottle, so we put a heater against the bottle.'],
    ['heat-on-the-cylinder', 'I played the torch on the cylinder to wake it up.'],
    ['heat-on-the-cylinder', 'We warmed the cylinder by the fire.'],
  ])('finds %s in “%s”', (practice, text) => {
    expect(practicesIn(text)).toEqual([practice]);
  });

  it.each([
    'Never turn the gas on and then look for a match.',
    'We had the flame at the burner first, then opened the gas.',
    'It went out; we did not relight it straight away but opened the lid and waited.',
    'Relighting in a hot chamber is dangerous.',
    'Do not fire in the garage.',
    'The kiln is stored in the garage between firings.',
    'I fetched the shelf from the shed and fired outdoors.',
    'Never leave the kiln alone while it burns.',
    'I left the glaze alone this time.',
    'Never lift the bin without a mask.',
    'I wore a mask in the smoke.',
    'Never heat a cylinder with a torch.',
    'A torch on the bottle’s neck gave it a flash of copper.',
    'The burner hissed, the pots glowed, and it went up evenly.',
  ])('finds nothing in “%s”', (text) => {
    expect(practicesIn(text)).toEqual([]);
  });

  it('does not count a caution block, and does count a quote', () => {
    const text = 'We fired in the garage.';
    expect(practicesIn(text, 'caution')).toEqual([]);
    expect(practicesIn(text, 'quote')).toEqual(['indoors']);
  });

  it('says where the passage stands', () => {
    const text = 'All went well. Then we fired in the garage.';
    const [passage] = unsafePassages([
      { kind: 'heading', text: 'A day' },
      { kind: 'text', text },
    ]);
    expect(passage?.blockIndex).toBe(1);
    expect(text.slice(passage?.from, passage?.to)).toBe('fired in the garage');
  });

  it('lets no negation of an earlier sentence excuse a later one', () => {
    expect(practicesIn('Do not do as I did. I left the kiln alone.')).toEqual(['left-alone']);
  });
});
