import type { Route } from '../../http/define-route';

export const peopleRoutes: readonly Route[] = [];
