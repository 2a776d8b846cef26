interface Props {
  /** Sanitised on the server; nothing changes it afterwards. */
  readonly html: string;
}

/** The story as written. */
export function NoteStory({ html }: Props) {
  if (html.trim() === '') return null;
  return (
    // Not named as a region: its asides may stand in no other landmark than the page’s main one.
    <section className="space-y-3">
      <h2 id="story" className="text-section">
        Story
      </h2>
      <div className="story" dangerouslySetInnerHTML={{ __html: html }} />
    </section>
  );
}
