import type { Stage } from './stage';

/** One story in the real program, told from the first touch to the last. Nothing of it is left for the next. */
export type Journey = {
  /** A sentence about behaviour. */
  readonly name: string;
  readonly run: (stage: Stage) => Promise<void>;
};
