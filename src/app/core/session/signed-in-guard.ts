import { inject } from '@angular/core';
import { type CanActivateFn, Router } from '@angular/router';

import { CurrentSession } from './current-session';

/** Sends whoever is not signed in to the sign-in page, and back afterwards. */
export const signedInGuard: CanActivateFn = (_route, state) => {
  if (inject(CurrentSession).user()) return true;
  const queryParams = state.url === '/' ? {} : { next: state.url };
  return inject(Router).createUrlTree(['/sign-in'], { queryParams });
};
