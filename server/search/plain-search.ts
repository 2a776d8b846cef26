import type { Knex } from 'knex';
import type { QuestionReading } from '#shared/question/reading-types.ts';

const MOST = 100;

/**
 * The plain search, for when the engine is away: MariaDB's full text over titles and stories, the
 * trouble that was read first. @returns note ids, best first
 */
export async function plainSearch(db: Knex, reading: QuestionReading): Promise<number[]> {
  const text = reading.q.slice(0, 300);
  const [trouble] = reading.trouble;
  const query = db('published_firings')
    .leftJoin('firing_troubles', (join) => {
      join
        .on('firing_troubles.note_id', 'published_firings.note_id')
        .andOnVal('firing_troubles.trouble', trouble ?? '')
        .andOnVal('firing_troubles.disputed', false);
    })
    .orderByRaw(
      '(firing_troubles.trouble IS NOT NULL) DESC, MATCH (published_firings.title, published_firings.story_text) AGAINST (? IN NATURAL LANGUAGE MODE) DESC, published_firings.published_at DESC',
      [text],
    )
    .limit(MOST);
  if (text.trim() !== '') {
    void query.where((either) => {
      void either
        .whereRaw(
          'MATCH (published_firings.title, published_firings.story_text) AGAINST (? IN NATURAL LANGUAGE MODE)',
          [text],
        )
        .orWhereNotNull('firing_troubles.trouble');
    });
  }
  return query.pluck<number[]>('published_firings.note_id');
}
