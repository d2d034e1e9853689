import type { Fault } from './fault';
import { cycleFaults } from './plants/cycle';
import { facingAndGapFaults } from './plants/facing-and-gaps';
import { labelFaults } from './plants/labels';
import { lidAndStackFaults } from './plants/lids-and-stacks';
import { massFaults } from './plants/masses';
import { poseFaults } from './plants/poses';
import { pouchFaults } from './plants/pouches';
import { proofFaults } from './plants/proof';
import { sizeFaults } from './plants/sizes';
import { spaceFaults } from './plants/space';

/** Every kind of fault that is planted. */
export const faults: readonly Fault[] = [
  ...pouchFaults,
  ...facingAndGapFaults,
  ...lidAndStackFaults,
  ...poseFaults,
  ...spaceFaults,
  ...massFaults,
  ...cycleFaults,
  ...proofFaults,
  ...labelFaults,
  ...sizeFaults,
];
