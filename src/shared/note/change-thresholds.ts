/**
 * How far a field must differ before the difference is proposed as a change. All are our own
 * choices: small enough to catch what somebody does on purpose, large enough to pass over what a
 * tape, a gauge or a memory is out by. The author confirms or refuses each proposal.
 */
export const PRESSURE_BAR = 0.05;
export const ANGLE_DEGREES = 10;
export const SETBACK_MM = 10;
export const CYLINDER_KG = 1;
export const FLUE_COVER_PERCENT = 10;
export const FLUE_OPENING_MM = 10;
export const LID_GAP_MM = 2;
export const LINING_MM = 5;
export const SHELF_THICKNESS_MM = 3;
export const SHELF_SHARE_PERCENT = 10;
export const SHELF_HEIGHT_MM = 10;
export const TARGET_CELSIUS = 10;
export const BISQUE_CELSIUS = 20;
export const HOLD_MINUTES = 2;
export const WALL_MM = 2;
export const PROBE_MM = 20;
export const AIR_SECONDS = 10;
export const COVERED_MINUTES = 5;
/** Relative differences: of the load, the container, the combustible, and of times after the draw. */
export const BURNER_SHARE = 0.1;
export const LOAD_SHARE = 0.2;
export const CONTAINER_SHARE = 0.2;
export const COMBUSTIBLE_SHARE = 0.25;
export const TIME_SHARE = 0.25;
