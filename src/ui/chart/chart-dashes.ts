/** The dashes of the second probe and of the record compared with. */
export const DASHES = { second: '6 3', overlay: '1.5 3.5' } as const;
