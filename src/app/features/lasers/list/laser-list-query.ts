import {
  LASER_SORTS,
  type LaserFilter,
  laserFilterSchema,
  type LaserListQuery,
} from '@shared/model/lasers';

import { PAGE_ROWS } from '../../../core/paging/keyset-list';

/** What the list shows; the address holds it in the words of the API. */
export interface LaserListState {
  readonly filter: LaserFilter;
  readonly sort: LaserListQuery['sort'];
  readonly order: LaserListQuery['order'];
  readonly rows: number;
}

export type AddressParams = Readonly<Record<string, string | undefined>>;

const FILTERS = Object.keys(laserFilterSchema.shape) as (keyof LaserFilter)[];

/** Reads the address; what it says wrongly is left out. */
export function readListState(params: AddressParams): LaserListState {
  const filter = Object.fromEntries(
    FILTERS.map((name) => [name, readFilter(name, params[name])]).filter(
      ([, value]) => value !== undefined && value !== '',
    ),
  ) as LaserFilter;
  return {
    filter,
    sort: LASER_SORTS.find((sort) => sort === params['sort']) ?? 'attention',
    order: params['order'] === 'desc' ? 'desc' : 'asc',
    rows: Math.max(PAGE_ROWS, Math.floor(Number(params['rows'])) || 0),
  };
}

/** The address's parameters; null takes out what is not said. */
export function writeListState(state: LaserListState): Record<string, string | null> {
  const filters = FILTERS.map((name) => {
    const value = state.filter[name];
    return [name, value === undefined ? null : String(value)] as const;
  });
  return {
    ...Object.fromEntries(filters),
    sort: state.sort === 'attention' ? null : state.sort,
    order: state.order === 'asc' ? null : state.order,
    rows: state.rows > PAGE_ROWS ? String(state.rows) : null,
  };
}

function readFilter(name: keyof LaserFilter, text: string | undefined): unknown {
  if (text === undefined) return undefined;
  return laserFilterSchema.shape[name].safeParse(text).data;
}
