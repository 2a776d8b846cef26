/** What a person reads for a field of a note, by the last part of its pointer. */
const FIELD_LABELS: Readonly<Record<string, string>> = {
  unreportedFirings: 'Firings not written up',
  startCelsius: 'Kiln temperature at the start',
  burnerAngleDegrees: 'Burner angle to the wall',
  burnerSetbackMm: 'Burner setback',
  flueCoverPercent: 'Flue cover',
  lidGapMm: 'Lid gap',
  shelfThicknessMm: 'Shelf thickness',
  shelfHeightMm: 'Shelf height on its posts',
  shelfFloorSharePercent: 'Shelf’s share of the floor',
  loadPieces: 'Pieces in the kiln',
  loadKg: 'Load',
  airCelsius: 'Air temperature',
  regulatorBar: 'Regulator pressure',
  cylinderKg: 'Cylinder',
  gasUsedKg: 'Gas used',
  probeDepthMm: 'Probe depth',
  probeFromFlameMm: 'Probe’s distance from the flame',
  probeFromWareMm: 'Probe’s distance from the ware',
  targetCelsius: 'Target',
  peakCelsius: 'Peak',
  timeToTemperatureMinutes: 'Time to temperature',
  holdPlannedMinutes: 'Hold planned',
  holdKeptMinutes: 'Hold kept',
  count: 'Number alike',
  spanMm: 'Widest span',
  wallMm: 'Wall',
  bisqueCelsius: 'Bisque temperature',
  kilnCelsiusAtLoading: 'Kiln temperature at loading',
  drawMinute: 'Draw time',
  drawOrder: 'Draw order',
  secondsInAir: 'Seconds in air',
  containerLitres: 'Container',
  litres: 'Combustible',
  burpedTimes: 'Times burped',
  burpedFirstAfterSeconds: 'First burp after',
  minutesCovered: 'Minutes covered',
  thenAfterMinutes: 'Minutes until cooled, sprayed or quenched',
};

/** The label of the field a pointer names, with its row: "Piece row 2, wall". */
export function labelOf(pointer: string): string {
  const parts = pointer.split('/');
  const label = FIELD_LABELS[parts.at(-1) ?? ''] ?? 'This field';
  const row = parts[1] === 'pieces' ? Number(parts[2]) : Number.NaN;
  if (Number.isInteger(row)) {
    return `Piece row ${String(row + 1)}, ${label.charAt(0).toLowerCase()}${label.slice(1)}`;
  }
  return label;
}
