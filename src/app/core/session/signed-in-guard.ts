import { inject } from '@angular/core';
import { type CanActivateFn, Router } from '@angular/router';

import { CurrentSession } from './current-session';

/**
 * Sends whoever is not signed in to the sign-in page, and back afterwards; while the site has no
 * administrator, to the page that makes the first.
 */
export const signedInGuard: CanActivateFn = (_route, state) => {
  const session = inject(CurrentSession);
  if (session.user()) return true;
  if (session.needsSetup()) return inject(Router).createUrlTree(['/set-up']);
  const queryParams = state.url === '/' ? {} : { next: state.url };
  return inject(Router).createUrlTree(['/sign-in'], { queryParams });
};
