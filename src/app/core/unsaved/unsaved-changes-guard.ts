import { inject } from '@angular/core';
import type { CanDeactivateFn } from '@angular/router';
import { map } from 'rxjs';

import { ConfirmDialog } from '../../ui/confirm-dialog/confirm-dialog';

/** A page that may hold something typed and not saved. */
export interface HoldsUnsavedChanges {
  hasUnsavedChanges(): boolean;
  /** What becomes of it when the person leaves, in one sentence. */
  readonly whenLeft: string;
}

/** Asks before what was typed and not saved is left behind. */
export const unsavedChangesGuard: CanDeactivateFn<HoldsUnsavedChanges> = (page) => {
  if (!page.hasUnsavedChanges()) return true;
  return inject(ConfirmDialog)
    .ask({ title: 'Leave without saving?', text: page.whenLeft, action: 'Leave' })
    .pipe(map((answer) => answer !== null));
};
