import type { CycleType } from '#domain/load/model';

export const cycleTypeWords: Readonly<Record<CycleType, string>> = {
  'dynamic-air-removal': 'Dynamic air removal',
  gravity: 'Gravity',
  'immediate-use': 'Immediate use',
};
