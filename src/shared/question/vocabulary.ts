import { CAUSE_VOCABULARY } from './vocabulary-causes.ts';
import { CHANGE_VOCABULARY } from './vocabulary-changes.ts';
import { CRACK_VOCABULARY } from './vocabulary-cracks.ts';
import type { VocabularyEntry } from './vocabulary-entry.ts';
import { FLAME_VOCABULARY } from './vocabulary-flame.ts';
import { HANDLING_CAUSE_VOCABULARY } from './vocabulary-handling-causes.ts';
import { HEAT_VOCABULARY } from './vocabulary-heat.ts';
import { SUBJECT_VOCABULARY } from './vocabulary-subjects.ts';
import { NOT_MEANT } from './vocabulary-not-meant.ts';
import { WARE_VOCABULARY } from './vocabulary-ware.ts';
import { WARE_CHANGE_VOCABULARY } from './vocabulary-ware-changes.ts';

/**
 * All that a question's words can mean. Order only decides between phrases of one length that begin
 * at the same word: the earlier wins.
 */
export const VOCABULARY: readonly VocabularyEntry[] = [
  ...NOT_MEANT,
  ...HEAT_VOCABULARY,
  ...FLAME_VOCABULARY,
  ...CRACK_VOCABULARY,
  ...WARE_VOCABULARY,
  ...SUBJECT_VOCABULARY,
  ...CAUSE_VOCABULARY,
  ...HANDLING_CAUSE_VOCABULARY,
  ...CHANGE_VOCABULARY,
  ...WARE_CHANGE_VOCABULARY,
];
