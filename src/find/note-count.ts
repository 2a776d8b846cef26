/** "1 note", "No notes", "12 notes". */
export const noteCount = (total: number): string =>
  total === 1 ? '1 note' : total === 0 ? 'No notes' : `${String(total)} notes`;
