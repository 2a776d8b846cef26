import type { TopicQuery } from '#shared/api/figure-topics.ts';
import { topicQuerySchema } from '#shared/api/figure-topics.ts';
import {
  DIMENSIONS_OF_TOPIC,
  FIGURE_TOPIC_IDS,
  type FigureDimension,
  type FigureTopic,
} from '#shared/vocabulary/figures.ts';

/** What the address of the page says: a plot can be sent to somebody. */
export interface FiguresAddress {
  readonly topic: FigureTopic;
  readonly query: TopicQuery & { readonly by: FigureDimension };
}

const NAMES = ['by', 'kiln', 'ware', 'a', 'b'] as const;

/** Reads the address; what it does not know, it leaves out. */
export function readFiguresAddress(params: URLSearchParams): FiguresAddress {
  const topic = FIGURE_TOPIC_IDS.find((id) => id === params.get('topic')) ?? 'cracks';
  const query: TopicQuery = {};
  for (const name of NAMES) {
    const one = topicQuerySchema.safeParse({ [name]: params.get(name) ?? undefined });
    if (one.success) Object.assign(query, one.data);
  }
  const possible = DIMENSIONS_OF_TOPIC[topic];
  const by = possible.find((each) => each === query.by) ?? possible[0] ?? 'form';
  return { topic, query: { ...query, by } };
}

export function writeFiguresAddress({ topic, query }: FiguresAddress): URLSearchParams {
  const params = new URLSearchParams({ topic });
  for (const name of NAMES) {
    const value = query[name];
    if (value !== undefined) params.set(name, String(value));
  }
  return params;
}
