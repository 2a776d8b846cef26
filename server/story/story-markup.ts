import { pictureUrl, type Picture } from '#shared/api/pictures.ts';
import { isSafeLink, type Story, type StoryBlock, type StoryInline } from '#shared/note/story.ts';

const ESCAPES: Readonly<Record<string, string>> = {
  '&': '&amp;',
  '<': '&lt;',
  '>': '&gt;',
  '"': '&quot;',
  "'": '&#39;',
};
/** Text as HTML text or as a quoted attribute value. */
export function escapeHtml(text: string): string {
  return text.replace(/[&<>"']/g, (character) => ESCAPES[character] ?? character);
}

const ASIDES: Readonly<Record<string, string>> = {
  caution: 'Caution',
  change: 'What I would change',
};

/**
 * A story, already checked against its schema, as HTML of a short list of elements. Pictures the
 * note does not have are left out. The result still goes through the sanitiser.
 */
export function storyMarkup(story: Story, pictures: readonly Picture[]): string {
  const byName = new Map(pictures.map((picture) => [picture.name, picture]));

  const inlineMarkup = (node: StoryInline): string => {
    if (node.type === 'hardBreak') return '<br>';
    return (node.marks ?? []).reduce((html, mark) => {
      switch (mark.type) {
        case 'bold':
          return `<strong>${html}</strong>`;
        case 'italic':
          return `<em>${html}</em>`;
        case 'link':
          return isSafeLink(mark.attrs.href)
            ? `<a href="${escapeHtml(mark.attrs.href)}" rel="noopener nofollow ugc">${html}</a>`
            : html;
      }
    }, escapeHtml(node.text));
  };
  const children = (block: StoryBlock): string =>
    (block.content ?? [])
      .map((child) =>
        child.type === 'text' || child.type === 'hardBreak'
          ? inlineMarkup(child)
          : blockMarkup(child),
      )
      .join('');
  const pictureMarkup = (block: StoryBlock): string => {
    const name = block.attrs?.['name'];
    const picture = typeof name === 'string' ? byName.get(name) : undefined;
    if (!picture) return '';
    const alt = escapeHtml(String(block.attrs?.['alt'] ?? ''));
    const caption = String(block.attrs?.['caption'] ?? '');
    const widest = picture.widths.at(-1) ?? picture.width;
    const shown = picture.widths.find((width) => width >= 960) ?? widest;
    const sources = picture.widths
      .map((width) => `${pictureUrl(picture.name, width)} ${String(width)}w`)
      .join(', ');
    const img = `<img src="${pictureUrl(picture.name, shown)}" srcset="${sources}" sizes="(min-width: 48rem) 42rem, 100vw" alt="${alt}" width="${String(picture.width)}" height="${String(picture.height)}" loading="lazy">`;
    return `<figure>${img}${caption ? `<figcaption>${escapeHtml(caption)}</figcaption>` : ''}</figure>`;
  };
  const blockMarkup = (block: StoryBlock): string => {
    switch (block.type) {
      case 'paragraph':
        return `<p>${children(block)}</p>`;
      case 'heading': {
        // The page's title is level 1 and "Story" level 2: the author's headings go below.
        const level = block.attrs?.['level'] === 3 ? 'h4' : 'h3';
        return `<${level}>${children(block)}</${level}>`;
      }
      case 'bulletList':
        return `<ul>${children(block)}</ul>`;
      case 'orderedList': {
        const start = Number(block.attrs?.['start'] ?? 1);
        return `<ol${start === 1 ? '' : ` start="${String(start)}"`}>${children(block)}</ol>`;
      }
      case 'listItem':
        return `<li>${children(block)}</li>`;
      case 'blockquote':
        return `<blockquote>${children(block)}</blockquote>`;
      case 'horizontalRule':
        return '<hr>';
      case 'aside': {
        const kind = block.attrs?.['kind'] === 'caution' ? 'caution' : 'change';
        return `<aside class="${kind}" role="note"><p class="aside-label">${ASIDES[kind] ?? ''}</p>${children(block)}</aside>`;
      }
      case 'picture':
        return pictureMarkup(block);
    }
  };
  return story.content.map(blockMarkup).join('\n');
}
