import { accountRoutes } from './accounts/account-routes.ts';
import { sessionRoutes } from './accounts/session-routes.ts';
import { memberRoutes } from './accounts/member-routes.ts';
import { adminRoutes } from './admin/admin-routes.ts';
import { deskRoutes } from './desk/desk-routes.ts';
import { disputeRoutes } from './disputes/dispute-routes.ts';
import { figureRoutes } from './figures/figure-routes.ts';
import type { Route } from './http/define-route.ts';
import { reportRoutes } from './http/report-routes.ts';
import { kilnRoutes } from './kilns/kiln-routes.ts';
import { draftRoutes } from './notes/draft-routes.ts';
import { lookAlikeRoutes } from './look-alikes/look-alike-routes.ts';
import { noteRoutes } from './notes/note-routes.ts';
import { pictureRoutes } from './pictures/picture-routes.ts';
import { questionRoutes } from './questions/question-routes.ts';
import { recordRoutes } from './records/record-routes.ts';
import { savedSearchRoutes } from './saved-searches/saved-search-routes.ts';
import { searchRoutes } from './search/search-routes.ts';

/** Every route of the API, feature by feature; a test compares this with the table of rights. */
export const ROUTES: readonly Route[] = [
  ...reportRoutes,
  ...sessionRoutes,
  ...accountRoutes,
  ...memberRoutes,
  ...kilnRoutes,
  ...noteRoutes,
  ...draftRoutes,
  ...questionRoutes,
  ...recordRoutes,
  ...pictureRoutes,
  ...deskRoutes,
  ...disputeRoutes,
  ...searchRoutes,
  ...savedSearchRoutes,
  ...lookAlikeRoutes,
  ...figureRoutes,
  ...adminRoutes,
];
