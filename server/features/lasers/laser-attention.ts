import type { TodayItem } from '@shared/model/today';
import { dateWords, daysBetween, type LocalDate } from '@shared/model/local-date';

import type { LaserRecord } from './laser-record';
import { NO_ATTENTION } from './laser-table';

type Facts = Pick<
  LaserRecord,
  'state' | 'standing' | 'reviewOn' | 'waiver' | 'quarantine' | 'input'
>;

export interface Attention {
  readonly rank: number;
  readonly words: string;
  /** As the list of today calls it; absent where nobody has to act on it today. */
  readonly kind?: TodayItem['kind'];
}

/** So many days ahead an end is told. */
const AHEAD_DAYS = 60;

/** What waits, worst first. */
export function attentionOf(laser: Facts, today: LocalDate): Attention[] {
  const { state, standing } = laser;
  const found: Attention[] = [];
  const add = (rank: number, words: string, kind?: TodayItem['kind']) =>
    found.push({ rank, words, ...(kind ? { kind } : {}) });
  if (IS_GONE.has(state)) return [];
  if (state === 'blocked') add(1, 'Blocked', 'blocked');
  if (standing === 'stale') add(2, 'Evaluation stale', 'stale');
  if (state === 'change-open') add(3, 'Change open');
  if (state === 'in-use' && (standing === 'none' || standing === 'open'))
    add(4, 'Not evaluated', 'not-evaluated');
  if (laser.waiver && !WAIVER_RESTS.has(state)) {
    const { untilOn } = laser.waiver;
    const left = daysBetween(today, untilOn);
    if (left < 0) add(5, `Waiver ended ${dateWords(untilOn)}`, 'waiver-ends');
    else if (left <= AHEAD_DAYS) add(6, `Waiver ends ${dateWords(untilOn)}`, 'waiver-ends');
  }
  if (state === 'service-open') add(7, 'Service open');
  if (state === 'received' && laser.quarantine) add(8, 'Quarantine');
  if (state === 'registered') add(9, 'Waits for the check of the LSO', 'laser-check');
  if (state === 'under-evaluation' && standing === 'none')
    add(10, 'Waits for an evaluation', 'not-evaluated');
  if (state === 'under-evaluation' && standing === 'open') add(11, 'Evaluation in work');
  if (laser.reviewOn && standing === 'approved') {
    const left = daysBetween(today, laser.reviewOn);
    if (left <= AHEAD_DAYS) add(12, `Review due ${dateWords(laser.reviewOn)}`, 'review-due');
  }
  if (laser.input.notSeenSince) add(13, `Not seen since ${dateWords(laser.input.notSeenSince)}`);
  return found.sort((a, b) => a.rank - b.rank);
}

/** The rank of the worst that waits. */
export function attentionRank(laser: Facts, today: LocalDate): number {
  return attentionOf(laser, today)[0]?.rank ?? NO_ATTENTION;
}

const IS_GONE: ReadonlySet<string> = new Set(['rejected', 'withdrawn', 'transferred', 'disposed']);
/** The waiver is about use; a laser that is not used needs none. */
const WAIVER_RESTS: ReadonlySet<string> = new Set([
  'blocked',
  'stored',
  'under-evaluation',
  'evaluated',
]);
