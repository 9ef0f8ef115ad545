import type { Routes } from '@angular/router';

import { GalleryPage } from './gallery-page';

export const GALLERY_ROUTES = [
  { path: '', title: 'Gallery', component: GalleryPage },
] satisfies Routes;
