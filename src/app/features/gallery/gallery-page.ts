import { ChangeDetectionStrategy, Component } from '@angular/core';

/** Development only: every piece of `ui` in every state, for the eye and for axe. */
@Component({
  selector: 'lm-gallery-page',
  template: '<main><h1>Gallery</h1></main>',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class GalleryPage {}
