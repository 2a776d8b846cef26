import type { Picture } from '#shared/api/pictures.ts';
import type { Story } from '#shared/note/story.ts';
import { sanitise } from './sanitise.ts';
import { storyMarkup } from './story-markup.ts';

/** The HTML of a story that readers are shown: nothing changes it after the sanitiser. */
export async function storyHtml(story: Story, pictures: readonly Picture[]): Promise<string> {
  return sanitise(storyMarkup(story, pictures));
}
