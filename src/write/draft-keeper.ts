import type { Draft } from '#shared/api/notes.ts';
import type { NoteFields } from '#shared/note/note-fields.ts';
import { noteFieldsSchema } from '#shared/note/note-fields.ts';
import { z } from 'zod';
import { OfflineError, ProblemError } from '../http/client.ts';
import { saveDraft } from './draft-mutations.ts';
import { sameFields } from './field-differences.ts';
import { forgetUnsent, keepUnsent, unsentFor, type UnsentWork } from './unsent-work.ts';

/** How long after the last key a save goes out, and how long until it is tried again. */
const PAUSE_MILLISECONDS = 1200;
const RETRY_MILLISECONDS = 8000;
/** Unanswered saves remembered, to know them again if they arrived. */
const MOST_UNHEARD = 12;

export type SaveState =
  | { readonly kind: 'saved'; readonly at: string }
  | { readonly kind: 'waiting' }
  | { readonly kind: 'saving' }
  /** Not sent: no network, or the server is away. Tried again by itself. */
  | { readonly kind: 'unsent'; readonly reason: string; readonly keptHere: boolean }
  /** Saved elsewhere meanwhile: both versions are shown, and nothing is sent until one is chosen. */
  | {
      readonly kind: 'conflict';
      readonly theirs: NoteFields;
      readonly theirVersion: number;
      readonly theirsAt: string;
    }
  /** The server refused what was typed, or the note can no longer be edited. */
  | { readonly kind: 'refused'; readonly reason: string };

export interface KeptDraft {
  /** What is on the screen. */
  readonly fields: NoteFields;
  /** The server's last answer: checks, findings, record, remarks. */
  readonly draft: Draft;
  readonly state: SaveState;
}

const newWriter = (): string => crypto.randomUUID().slice(0, 8);

const staleSchema = z.object({
  version: z.number(),
  savedAt: z.string(),
  fields: noteFieldsSchema,
});

/**
 * Keeps one note's working copy: what is typed goes into this browser at once and to the server
 * soon after, one save at a time, each on top of the version before. It never overwrites what was
 * saved elsewhere, and never drops what was typed.
 */
export class DraftKeeper {
  readonly #memberId: number;
  #kept: KeptDraft;
  #listeners = new Set<() => void>();
  #timer: ReturnType<typeof setTimeout> | null = null;
  #saving: Promise<void> | null = null;
  #dirty = false;
  /** This page's own name for the copies it keeps. */
  readonly #writer = newWriter();
  /** The page whose copy was taken up; its copy goes when this page's is through. */
  #takenUp: string | null = null;
  /** Sent without an answer so far: a save may have arrived though its answer was lost. */
  #unheard: NoteFields[] = [];

  constructor(memberId: number, draft: Draft) {
    this.#memberId = memberId;
    this.#kept = { fields: draft.fields, draft, state: { kind: 'saved', at: draft.savedAt } };
    if (!draft.abilities.edit) return;
    for (const { writer, work } of unsentFor(memberId, draft.id)) {
      // A copy that arrived after all. Any other is taken up by this page, the last written first.
      if (sameFields(work.fields, draft.fields)) forgetUnsent(memberId, draft.id, writer);
      else if (!this.#dirty) this.#takeUp(writer, work);
    }
  }

  #takeUp(writer: string, work: UnsentWork): void {
    const { draft } = this.#kept;
    this.#dirty = true;
    this.#takenUp = writer;
    this.#kept = {
      ...this.#kept,
      fields: work.fields,
      state:
        work.fromVersion === draft.version
          ? { kind: 'waiting' }
          : {
              kind: 'conflict',
              theirs: draft.fields,
              theirVersion: draft.version,
              theirsAt: draft.savedAt,
            },
    };
  }

  readonly subscribe = (listener: () => void): (() => void) => {
    this.#listeners.add(listener);
    return () => this.#listeners.delete(listener);
  };
  readonly current = (): KeptDraft => this.#kept;

  /** True while something typed is not on the server. */
  get hasUnsent(): boolean {
    return this.#dirty;
  }

  /** Sends what was left unsent when the page was last closed. */
  start(): void {
    if (this.#dirty && this.#kept.state.kind === 'waiting') this.#schedule(PAUSE_MILLISECONDS);
  }

  /** Changes what is on the screen; kept here at once, sent soon. */
  readonly change = (update: (fields: NoteFields) => NoteFields): void => {
    const fields = update(this.#kept.fields);
    if (fields === this.#kept.fields) return;
    this.#dirty = true;
    const keptHere = this.#keepHere(fields);
    const { state } = this.#kept;
    this.#set({
      ...this.#kept,
      fields,
      state:
        state.kind === 'conflict' || state.kind === 'saving'
          ? state
          : state.kind === 'unsent'
            ? { ...state, keptHere }
            : { kind: 'waiting' },
    });
    if (state.kind !== 'conflict') this.#schedule(PAUSE_MILLISECONDS);
  };

  /** Sends now what is waiting, and resolves when the server has it or has said why not. */
  async flush(): Promise<void> {
    if (this.#timer !== null) clearTimeout(this.#timer);
    this.#timer = null;
    // Several may wait for the same save; whoever goes on first starts the next.
    while (this.#saving) await this.#saving;
    if (this.#dirty && this.#kept.state.kind !== 'conflict') {
      this.#saving = this.#save().finally(() => {
        this.#saving = null;
      });
      await this.#saving;
      if (this.#dirty && this.#kept.state.kind === 'waiting') await this.flush();
    }
  }

  /** After an act of its own (hand in, a picture, a record): what the server has now. */
  accept(draft: Draft): void {
    if (this.#dirty) {
      const { fields, draft: before, state } = this.#kept;
      const isSafe = draft.version === before.version || this.#isMineOrBase(draft.fields);
      this.#set({
        fields,
        draft,
        state: isSafe
          ? state
          : {
              kind: 'conflict',
              theirs: draft.fields,
              theirVersion: draft.version,
              theirsAt: draft.savedAt,
            },
      });
      return;
    }
    this.#set({ fields: draft.fields, draft, state: { kind: 'saved', at: draft.savedAt } });
  }

  /** Settles a conflict: mine goes on top of theirs, or theirs replaces mine. */
  settle(choice: 'mine' | 'theirs'): void {
    const { state } = this.#kept;
    if (state.kind !== 'conflict') return;
    const draft = {
      ...this.#kept.draft,
      version: state.theirVersion,
      savedAt: state.theirsAt,
      fields: state.theirs,
    };
    if (choice === 'theirs') {
      this.#dirty = false;
      this.#forget();
      this.#set({ fields: state.theirs, draft, state: { kind: 'saved', at: state.theirsAt } });
      return;
    }
    this.#set({ ...this.#kept, draft, state: { kind: 'waiting' } });
    this.#keepHere(this.#kept.fields);
    void this.flush();
  }

  /** The note is removed: nothing is sent any more. */
  abandon(): void {
    this.#dirty = false;
    this.#forget();
    this.close();
  }

  /** Stops timers; what is unsent stays kept in this browser. */
  close(): void {
    if (this.#timer !== null) clearTimeout(this.#timer);
    this.#timer = null;
  }

  /** What the server has is what was here before, or what a save brought there unheard. */
  #isMineOrBase(theirs: NoteFields): boolean {
    const { fields, draft } = this.#kept;
    return [fields, draft.fields, ...this.#unheard].some((known) => sameFields(known, theirs));
  }

  #keepHere(fields: NoteFields): boolean {
    const { id, version } = this.#kept.draft;
    const work = { fromVersion: version, at: new Date().toISOString(), fields };
    return keepUnsent(this.#memberId, id, work, this.#writer);
  }

  #forget(): void {
    for (const writer of [this.#writer, this.#takenUp]) {
      if (writer !== null) forgetUnsent(this.#memberId, this.#kept.draft.id, writer);
    }
    this.#takenUp = null;
  }

  #schedule(milliseconds: number): void {
    if (this.#timer !== null) clearTimeout(this.#timer);
    this.#timer = setTimeout(() => void this.flush(), milliseconds);
  }

  #set(kept: KeptDraft): void {
    this.#kept = kept;
    for (const listener of this.#listeners) listener();
  }

  async #save(): Promise<void> {
    const { draft, fields } = this.#kept;
    this.#unheard = [...this.#unheard.filter((sent) => sent !== fields), fields].slice(
      -MOST_UNHEARD,
    );
    this.#set({ ...this.#kept, state: { kind: 'saving' } });
    try {
      const answer = await saveDraft(draft.id, draft.version, fields);
      this.#unheard = [];
      const newer = this.#kept.fields !== fields;
      this.#dirty = newer;
      this.#set({
        fields: this.#kept.fields,
        draft: answer,
        state: newer ? { kind: 'waiting' } : { kind: 'saved', at: answer.savedAt },
      });
      if (newer) {
        this.#keepHere(this.#kept.fields);
        this.#schedule(PAUSE_MILLISECONDS);
      } else {
        this.#forget();
      }
    } catch (error) {
      this.#failed(error);
    }
  }

  #failed(error: unknown): void {
    if (error instanceof ProblemError && error.problem.status === 412) {
      const current = staleSchema.safeParse(error.problem.current);
      if (current.success && this.#isMineOrBase(current.data.fields)) {
        // Nobody else wrote: only the version went on. Mine goes on top of it.
        const { version, savedAt, fields } = current.data;
        const draft = { ...this.#kept.draft, version, savedAt, fields };
        this.#dirty = !sameFields(fields, this.#kept.fields);
        if (!this.#dirty) this.#forget();
        this.#set({
          ...this.#kept,
          draft,
          state: this.#dirty ? { kind: 'waiting' } : { kind: 'saved', at: savedAt },
        });
        if (this.#dirty) {
          this.#keepHere(this.#kept.fields);
          this.#schedule(PAUSE_MILLISECONDS);
        }
        return;
      }
      if (current.success) {
        this.#set({
          ...this.#kept,
          state: {
            kind: 'conflict',
            theirs: current.data.fields,
            theirVersion: current.data.version,
            theirsAt: current.data.savedAt,
          },
        });
        return;
      }
    }
    const keptHere = this.#keepHere(this.#kept.fields);
    const again =
      error instanceof OfflineError ||
      (error instanceof ProblemError && [429, 503, 507].includes(error.problem.status));
    const reason = error instanceof Error ? error.message : 'The save did not work.';
    this.#set({
      ...this.#kept,
      state: again ? { kind: 'unsent', reason, keptHere } : { kind: 'refused', reason },
    });
    if (again) this.#schedule(RETRY_MILLISECONDS);
  }
}
