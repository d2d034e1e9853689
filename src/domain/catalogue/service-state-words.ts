import type { ServiceState } from '../load/model';

/** How a sterilizer stands, for lists; in a sentence, with a small letter, after "is". */
export const serviceStateWords: Readonly<Record<ServiceState, string>> = {
  'in-service': 'In service',
  'out-of-service': 'Out of service',
  'awaiting-requalification': 'Awaiting requalification',
};
