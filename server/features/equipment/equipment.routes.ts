import type { Route } from '../../http/define-route';
import { airRemovalTestRoutes } from './air-removal-tests.routes';
import { cartRoutes } from './carts.routes';
import { holderKindRoutes } from './holder-kinds.routes';
import { holderRoutes } from './holders.routes';
import { placeLabelRoutes } from './place-labels.routes';
import { programRoutes } from './programs.routes';
import { sterilizerRoutes } from './sterilizers.routes';

export const equipmentRoutes: readonly Route[] = [
  ...programRoutes,
  ...sterilizerRoutes,
  ...cartRoutes,
  ...holderKindRoutes,
  ...holderRoutes,
  ...airRemovalTestRoutes,
  ...placeLabelRoutes,
];
