/** Whether a cell is the half of a day and nothing else: "AM", "p.m.". */
export function isHalfDay(cell: string): boolean {
  const { length } = cell;
  return length >= 2 && length <= 5 && /^[ap]\.? ?m\.?$/i.test(cell);
}

/** A time whose date, or half of the day, stands in a column of its own, as one text. */
export function timeText(date: string, time: string, behind: string): string {
  const whole = date === '' ? time : `${date} ${time}`;
  return behind !== '' && isHalfDay(behind) ? `${whole} ${behind}` : whole;
}
