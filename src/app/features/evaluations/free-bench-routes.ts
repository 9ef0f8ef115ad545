import type { Routes } from '@angular/router';

export const FREE_BENCH_ROUTES = [
  {
    path: '',
    title: 'Free bench',
    loadComponent: () => import('./free-bench/free-bench-page').then((m) => m.FreeBenchPage),
  },
] satisfies Routes;
