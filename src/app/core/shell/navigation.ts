import type { Action } from '@shared/permissions/permissions';

import type { IconName } from '../../ui/icon/icon-paths';

export interface Destination {
  readonly path: string;
  readonly word: string;
  readonly icon: IconName;
  /** What one must be allowed to do to find anything there. */
  readonly action: Action;
}

/** The first level of the product, in the order of the spine. */
export const DESTINATIONS: readonly Destination[] = [
  { path: '/today', word: 'Today', icon: 'today', action: 'today.read' },
  { path: '/lasers', word: 'Lasers', icon: 'lasers', action: 'laser.read' },
  { path: '/evaluations', word: 'Evaluations', icon: 'evaluations', action: 'evaluation.read' },
  { path: '/areas', word: 'Areas', icon: 'areas', action: 'area.read' },
  { path: '/people', word: 'People', icon: 'people', action: 'person.list' },
  { path: '/records', word: 'Records', icon: 'records', action: 'audit-trail.read' },
  { path: '/settings', word: 'Settings', icon: 'settings', action: 'settings.read' },
];

export const HELP: Destination = {
  path: '/help',
  word: 'Help',
  icon: 'help',
  action: 'session.read',
};
