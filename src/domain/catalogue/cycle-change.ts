import type { ProgramFields } from './equipment-fields';

/*
 * A sterilizer is qualified for a cycle as it runs, not for the program's name: with another type, temperature, exposure or
 * drying it is another cycle, which nobody has shown to work yet. Common practice, no source.
 */

const cycleFields = ['type', 'temperatureC', 'exposureS', 'dryS'] as const satisfies readonly (keyof ProgramFields)[];

export type CycleField = (typeof cycleFields)[number];

/** What makes the cycle of a program another one; empty while it is the same. */
export function cycleChanges(
  before: Pick<ProgramFields, CycleField>,
  after: Partial<Pick<ProgramFields, CycleField>>,
): readonly CycleField[] {
  return cycleFields.filter((field) => after[field] !== undefined && after[field] !== before[field]);
}
