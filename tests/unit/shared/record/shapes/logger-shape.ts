import type { FileShape } from '../../../../support/logger-files.ts';

/** A shape of file, and what is to come of it. */
export interface LoggerShape {
  readonly name: string;
  readonly shape: FileShape;
  readonly encoding?: 'utf-8' | 'utf-8-bom' | 'utf-16le' | 'utf-16be' | 'utf-16le-bare' | 'latin-1';
  readonly expected?: {
    /** Which of the true readings are left. */
    readonly kept?: (index: number) => boolean;
    readonly within?: number;
    readonly late?: number;
    readonly says?: readonly string[];
    readonly saysNot?: readonly string[];
    readonly second?: number | null;
    /** Nothing at all is assumed. */
    readonly silent?: boolean;
  };
}
