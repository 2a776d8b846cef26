import { Meilisearch } from 'meilisearch';
import { NOTES_INDEX } from '../../search/note-document.ts';
import type { Config } from '../config.ts';

/** A search must not keep a reader waiting for an engine that does not answer. */
const SEARCH_MILLISECONDS = 3000;
const WRITE_MILLISECONDS = 30_000;
/** The same at every start, so that the key is found again instead of made anew. */
const SEARCH_KEY_UID = '6d1f6c0a-5b0e-4a8e-9c39-1b6f0a7d2e51';

const clients = new Map<string, { writing: Meilisearch; searching: Promise<Meilisearch> | null }>();

function clientsFor(config: Config) {
  const known = clients.get(config.search.url);
  if (known) return known;
  const made = {
    writing: new Meilisearch({
      host: config.search.url,
      apiKey: config.search.key,
      timeout: WRITE_MILLISECONDS,
    }),
    searching: null,
  };
  clients.set(config.search.url, made);
  return made;
}

/** For the worker: writes documents and settings. */
export function writingClient(config: Config): Meilisearch {
  return clientsFor(config).writing;
}

/**
 * For readers' searches: a key that can do nothing but search the one index. Where the configured
 * key may not make keys (not the master key), it is used itself.
 */
export async function searchingClient(config: Config): Promise<Meilisearch> {
  const own: { writing: Meilisearch; searching: Promise<Meilisearch> | null } = clientsFor(config);
  own.searching ??= searchKey(own.writing, config.search.key).then(
    (apiKey) => new Meilisearch({ host: config.search.url, apiKey, timeout: SEARCH_MILLISECONDS }),
  );
  try {
    return await own.searching;
  } catch (error) {
    own.searching = null;
    throw error;
  }
}

async function searchKey(client: Meilisearch, configured: string): Promise<string> {
  try {
    return (await client.getKey(SEARCH_KEY_UID)).key;
  } catch (error) {
    if (!isRefusal(error)) throw error;
  }
  try {
    const made = await client.createKey({
      uid: SEARCH_KEY_UID,
      name: 'Spyhole readers',
      description: 'Searches published notes, nothing else.',
      actions: ['search'],
      indexes: [NOTES_INDEX],
      expiresAt: null,
    });
    return made.key;
  } catch (error) {
    if (isRefusal(error)) return configured;
    throw error;
  }
}

/** The engine answered, and said no; anything else means that it is away. */
function isRefusal(error: unknown): boolean {
  return error instanceof Error && error.name === 'MeilisearchApiError';
}
