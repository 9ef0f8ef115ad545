import { effect, inject } from '@angular/core';
import { ActivatedRoute, type Params, Router } from '@angular/router';

/**
 * Keeps what a page shows in its address, so that a link, a reload and Back bring it again. Null
 * takes a parameter out. Needs an injection context.
 */
export function keepInAddress(params: () => Params): void {
  const router = inject(Router);
  const relativeTo = inject(ActivatedRoute);
  // Writes to the address, which lies outside of Angular's state.
  effect(() => {
    const tree = router.createUrlTree([], { relativeTo, queryParams: params() });
    // A navigation to the same address would lose the place to which Back returns.
    if (router.serializeUrl(tree) === router.url) return;
    void router.navigateByUrl(tree, { replaceUrl: true, scroll: 'manual' });
  });
}
