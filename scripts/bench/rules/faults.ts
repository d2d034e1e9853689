import type { Fault } from './fault';
import { clearanceFaults } from './plants/clearances';
import { cycleFaults } from './plants/cycle';
import { edgeFaults } from './plants/edges';
import { facingAndGapFaults } from './plants/facing-and-gaps';
import { labelFaults } from './plants/labels';
import { filterFaults } from './plants/filters';
import { stackFaults } from './plants/stacks';
import { massFaults } from './plants/masses';
import { poseFaults } from './plants/poses';
import { pouchFaults } from './plants/pouches';
import { proofFaults } from './plants/proof';
import { sizeFaults } from './plants/sizes';

/** Every kind of fault that is planted. */
export const faults: readonly Fault[] = [
  ...pouchFaults,
  ...facingAndGapFaults,
  ...filterFaults,
  ...stackFaults,
  ...poseFaults,
  ...edgeFaults,
  ...clearanceFaults,
  ...massFaults,
  ...cycleFaults,
  ...proofFaults,
  ...labelFaults,
  ...sizeFaults,
];
