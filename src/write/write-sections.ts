/** The sections of the form in their order, with the members of a note that stand in each. */
export const WRITE_SECTIONS = [
  { id: 'when', title: 'When', members: ['when'] },
  { id: 'kiln', title: 'Kiln', members: ['kilnId'] },
  { id: 'set-up', title: 'Set-up', members: ['setUp'] },
  { id: 'plan', title: 'Plan', members: ['plan'] },
  { id: 'record', title: 'Record', members: ['record', 'findingDisputes'] },
  { id: 'pieces', title: 'Pieces', members: ['pieces'] },
  { id: 'reduction', title: 'After the draw', members: ['reduction'] },
  { id: 'result', title: 'Result', members: ['result'] },
  { id: 'changes', title: 'Changes', members: ['changes', 'changesNotMeant', 'triedNoteId'] },
  { id: 'story', title: 'Story', members: ['title', 'story'] },
  { id: 'hand-in', title: 'Hand in', members: ['cautionsRead', 'checkAnswers'] },
] as const;
export type WriteSectionId = (typeof WRITE_SECTIONS)[number]['id'];

/** The section in which the field at a pointer stands; null for the note as a whole. */
export function sectionOf(pointer: string): WriteSectionId | null {
  const member = pointer.split('/')[1] ?? '';
  return (
    WRITE_SECTIONS.find(({ members }) => (members as readonly string[]).includes(member))?.id ??
    null
  );
}

/** How many of the pointers lie in each section. */
export function countBySection(pointers: readonly string[]): ReadonlyMap<WriteSectionId, number> {
  const counts = new Map<WriteSectionId, number>();
  for (const pointer of pointers) {
    const section = sectionOf(pointer);
    if (section) counts.set(section, (counts.get(section) ?? 0) + 1);
  }
  return counts;
}
