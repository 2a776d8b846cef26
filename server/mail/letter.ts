/** What a message is made of; `composeMail` adds whom it goes to. */
export interface Letter {
  readonly subject: string;
  readonly text: string;
  /** Header fields of our own making: name → value without line ends. */
  readonly headers?: Readonly<Record<string, string>>;
}

/**
 * The body of a mail: greeting, paragraphs, and who writes. Lines of a name or title cannot run on:
 * both are one line by the time they come here.
 */
export function letter(subject: string, name: string, paragraphs: readonly string[]): Letter {
  return {
    subject,
    text: [`Hello ${name},`, ...paragraphs, 'Spyhole, the notebook of raku firings'].join('\n\n'),
  };
}

/** A reason or remark, set off from our own words. */
export function quoted(text: string): string {
  return text
    .split('\n')
    .map((line) => `> ${line}`)
    .join('\n');
}
