/** The rows with one moved by `by` places; unchanged where it would leave the list. */
export function moveRow<Row>(rows: readonly Row[], index: number, by: -1 | 1): readonly Row[] {
  const row = rows[index];
  const target = index + by;
  if (row === undefined || target < 0 || target >= rows.length) return rows;
  const next = rows.filter((_, one) => one !== index);
  next.splice(target, 0, row);
  return next;
}

/** The rows without one. */
export function removeRow<Row>(rows: readonly Row[], index: number): readonly Row[] {
  return rows.filter((_, one) => one !== index);
}
