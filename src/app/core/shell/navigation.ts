import type { IconName } from '../../ui/icon/icon-paths';

export interface Destination {
  readonly path: string;
  readonly word: string;
  readonly icon: IconName;
}

/** The first level of the product, in the order of the spine. */
export const DESTINATIONS: readonly Destination[] = [
  { path: '/today', word: 'Today', icon: 'today' },
  { path: '/lasers', word: 'Lasers', icon: 'lasers' },
  { path: '/evaluations', word: 'Evaluations', icon: 'evaluations' },
  { path: '/areas', word: 'Areas', icon: 'areas' },
  { path: '/people', word: 'People', icon: 'people' },
  { path: '/records', word: 'Records', icon: 'records' },
  { path: '/settings', word: 'Settings', icon: 'settings' },
];

export const HELP: Destination = { path: '/help', word: 'Help', icon: 'help' };
