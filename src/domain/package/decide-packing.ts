import { accept, refuse, type Result } from '../result';

/*
 * A package gets its label only when a person has said that the contents are complete and that an internal indicator lies
 * inside: nobody can look again once it is sealed. An internal indicator in each package: CDC, Guideline for Disinfection
 * and Sterilization in Healthcare Facilities (2008), recommendations on monitoring (read as excerpt); a house may ask for
 * less, so it is a parameter.
 */

export type PackingPolicy = {
  readonly needsInternalIndicator: boolean;
};

export const defaultPackingPolicy: PackingPolicy = { needsInternalIndicator: true };

export type PackingItem = {
  readonly code: string;
  readonly name: string;
  readonly isRetired: boolean;
  readonly ifuReference: string | null;
  /** Kilograms, packed. */
  readonly massKg: number;
  /** Kilograms, from its instructions for use; null where they are silent. */
  readonly massLimitKg: number | null;
};

export type PackingStatement = {
  readonly isContentsConfirmed: boolean;
  readonly hasInternalIndicator: boolean;
  readonly hasExternalIndicator: boolean;
};

export type PackingRefusal =
  'package.item-retired' | 'package.contents-not-confirmed' | 'package.internal-indicator-missing';

export type PackingWarning = {
  readonly code: 'ifu-missing' | 'external-indicator-missing' | 'over-its-mass-limit';
  readonly sentence: string;
};

/** Whether labels may be printed for this item, and what to look at although they may. */
export function decidePacking(
  item: PackingItem,
  statement: PackingStatement,
  policy: PackingPolicy,
): Result<{ readonly warnings: readonly PackingWarning[] }, PackingRefusal> {
  if (item.isRetired) {
    return refuse('package.item-retired', `${item.code} ${item.name} is retired and is not packed any more.`);
  }
  if (!statement.isContentsConfirmed) {
    return refuse('package.contents-not-confirmed', 'Confirm first that the contents are complete and in order.');
  }
  if (policy.needsInternalIndicator && !statement.hasInternalIndicator) {
    return refuse('package.internal-indicator-missing', 'Place the internal CI first, then say so here.');
  }
  return accept({ warnings: warningsAbout(item, statement) });
}

function warningsAbout(item: PackingItem, statement: PackingStatement): PackingWarning[] {
  const warnings: PackingWarning[] = [];
  if (item.ifuReference === null) {
    warnings.push({
      code: 'ifu-missing',
      sentence: `No instructions for use are on file for ${item.code}. A load that has it needs a lead’s acceptance.`,
    });
  }
  if (!statement.hasExternalIndicator) {
    warnings.push({
      code: 'external-indicator-missing',
      sentence: 'Without an external CI on the outside a load cannot close with it.',
    });
  }
  if (item.massLimitKg !== null && item.massKg > item.massLimitKg) {
    warnings.push({
      code: 'over-its-mass-limit',
      sentence: `${item.code} weighs ${item.massKg} kg, and its instructions for use allow ${item.massLimitKg} kg.`,
    });
  }
  return warnings;
}
