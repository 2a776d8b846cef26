/** Height of a lane of labels and size of their type, px. */
export const LANE_HEIGHT = 19;
export const LABEL_SIZE = 13;
