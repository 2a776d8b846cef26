import type { Draft } from '#shared/api/notes.ts';
import type { NoteFields } from '#shared/note/note-fields.ts';
import { saveDraft } from './draft-mutations.ts';
import { failedSave } from './failed-save.ts';
import { sameFields } from './field-differences.ts';
import { pageCopyOf, type PageCopy } from './page-copy.ts';
import { conflictWith, type KeptDraft } from './save-state.ts';
import { forgetUnsent, unsentFor, type UnsentWork } from './unsent-work.ts';

/** How long after the last key a save goes out, and how long until it is tried again. */
const PAUSE_MILLISECONDS = 1200;
const RETRY_MILLISECONDS = 8000;
/** Unanswered saves remembered, to know them again if they arrived. */
const MOST_UNHEARD = 12;

/**
 * Keeps one note's working copy: what is typed goes into this browser at once and to the server
 * soon after, one save at a time, each on top of the version before. It never overwrites what was
 * saved elsewhere, and never drops what was typed.
 */
export class DraftKeeper {
  readonly #copy: PageCopy;
  #kept: KeptDraft;
  #listeners = new Set<() => void>();
  #timer: ReturnType<typeof setTimeout> | null = null;
  #saving: Promise<void> | null = null;
  #dirty = false;
  /** Sent without an answer so far: a save may have arrived though its answer was lost. */
  #unheard: NoteFields[] = [];

  constructor(memberId: number, draft: Draft) {
    this.#copy = pageCopyOf(memberId, draft.id);
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
    this.#copy.takeUp(writer);
    this.#kept = {
      ...this.#kept,
      fields: work.fields,
      state: work.fromVersion === draft.version ? { kind: 'waiting' } : conflictWith(draft),
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
      this.#set({ fields, draft, state: isSafe ? state : conflictWith(draft) });
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
      this.#copy.forget();
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
    this.#copy.forget();
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
    return this.#copy.keep(fields, this.#kept.draft.version);
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
        this.#copy.forget();
      }
    } catch (error) {
      this.#failed(error);
    }
  }

  #failed(error: unknown): void {
    const failure = failedSave(error);
    if (failure.kind === 'stale') {
      const { current } = failure;
      if (this.#isMineOrBase(current.fields)) this.#goOnFrom(current);
      else this.#set({ ...this.#kept, state: conflictWith(current) });
      return;
    }
    const { kind, reason } = failure;
    const keptHere = this.#keepHere(this.#kept.fields);
    this.#set({
      ...this.#kept,
      state: kind === 'again' ? { kind: 'unsent', reason, keptHere } : { kind: 'refused', reason },
    });
    if (kind === 'again') this.#schedule(RETRY_MILLISECONDS);
  }

  /** Nobody else wrote: only the version went on. Mine goes on top of it. */
  #goOnFrom({ version, savedAt, fields }: Pick<Draft, 'version' | 'savedAt' | 'fields'>): void {
    const draft = { ...this.#kept.draft, version, savedAt, fields };
    this.#dirty = !sameFields(fields, this.#kept.fields);
    if (!this.#dirty) this.#copy.forget();
    this.#set({
      ...this.#kept,
      draft,
      state: this.#dirty ? { kind: 'waiting' } : { kind: 'saved', at: savedAt },
    });
    if (this.#dirty) {
      this.#keepHere(this.#kept.fields);
      this.#schedule(PAUSE_MILLISECONDS);
    }
  }
}
