import type { Route } from '../routing/route.ts';
import { accountRoutes } from './accounts/accountRoutes.ts';
import { designFileRoutes } from './designs/designFileRoutes.ts';
import { designLinkRoutes } from './designs/designLinkRoutes.ts';
import { designRoutes } from './designs/designRoutes.ts';
import { sensitivityRoutes } from './designs/sensitivityRoutes.ts';
import { cardRoutes } from './cards/cardRoutes.ts';
import { developmentRoutes } from './development/developmentRoutes.ts';
import { healthRoutes } from './health/healthRoutes.ts';
import { importRoutes } from './imports/importRoutes.ts';
import { linkRoutes } from './links/linkRoutes.ts';
import { liveRoutes } from './live/liveRoutes.ts';
import { materialEditRoutes } from './materials/materialEditRoutes.ts';
import { materialFitRoutes } from './materials/materialFitRoutes.ts';
import { materialRoutes } from './materials/materialRoutes.ts';
import { memberRoutes } from './members/memberRoutes.ts';
import { openApiRoutes } from './openapi/openApiRoutes.ts';
import { passwordResetRoutes } from './password-resets/passwordResetRoutes.ts';
import { runEventRoutes } from './runs/runEventRoutes.ts';
import { runFileRoutes } from './runs/runFileRoutes.ts';
import { runRoutes } from './runs/runRoutes.ts';
import { sessionRoutes } from './session/sessionRoutes.ts';
import { sharedDesignRoutes } from './shared/sharedDesignRoutes.ts';
import { sharedCardRoutes } from './shared/sharedCardRoutes.ts';
import { sharedRoutes } from './shared/sharedRoutes.ts';
import { sharedStudyRoutes } from './shared/sharedStudyRoutes.ts';
import { solveRoutes } from './solve/solveRoutes.ts';
import { stackRoutes } from './stacks/stackRoutes.ts';
import { studyLinkRoutes } from './studies/studyLinkRoutes.ts';
import { studyRoutes } from './studies/studyRoutes.ts';
import { tokenRoutes } from './tokens/tokenRoutes.ts';

const described: Route[] = [
  ...healthRoutes,
  ...sessionRoutes,
  ...accountRoutes,
  ...passwordResetRoutes,
  ...tokenRoutes,
  ...memberRoutes,
  ...stackRoutes,
  ...materialRoutes,
  ...materialEditRoutes,
  ...materialFitRoutes,
  ...importRoutes,
  ...solveRoutes,
  ...liveRoutes,
  ...runRoutes,
  ...runEventRoutes,
  ...runFileRoutes,
  ...designRoutes,
  ...designFileRoutes,
  ...designLinkRoutes,
  ...sensitivityRoutes,
  ...studyRoutes,
  ...studyLinkRoutes,
  ...cardRoutes,
  ...linkRoutes,
  ...sharedRoutes,
  ...sharedStudyRoutes,
  ...sharedCardRoutes,
  ...sharedDesignRoutes,
  ...developmentRoutes,
];

/** Every route of the API: mounted by app.ts, described in OpenAPI, held against their policies in a test. */
export const allRoutes: Route[] = [...described, ...openApiRoutes(described)];
