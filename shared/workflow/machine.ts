/**
 * A workflow as data: states, events, who, guard, next, effects. Server and client read the same
 * table; only the server moves a state.
 */
export interface Transition<
  State extends string,
  Event extends string,
  Guard extends string,
  Effect extends string,
> {
  /** `start`: the record does not exist yet. */
  readonly from: readonly (State | 'start')[];
  readonly event: Event;
  /** The words on the button. */
  readonly label: string;
  readonly actors: readonly Actor[];
  readonly guards: readonly Guard[];
  readonly to: State;
  readonly effects: readonly Effect[];
  /** What the step asks the person for. */
  readonly asks?: readonly Ask[];
}

export type Ask = 'reason' | 'comment' | 'waiver' | 'area' | 'password';

/**
 * Who may do a step. `system`: no person. `supervisor`: of the record's area. `author`, `checker`:
 * the person in that part of this evaluation. `anyone`: every signed-in person.
 */
export type Actor =
  | 'system'
  | 'lso'
  | 'deputy-lso'
  | 'committee'
  | 'supervisor'
  | 'purchasing'
  | 'author'
  | 'checker'
  | 'anyone';

export interface Machine<
  State extends string,
  Event extends string,
  Guard extends string,
  Effect extends string,
> {
  readonly name: string;
  readonly states: readonly State[];
  readonly terminal: readonly State[];
  readonly transitions: readonly Transition<State, Event, Guard, Effect>[];
}

/** The transition that `event` takes from `state`; undefined when the table has none. */
export function findTransition<
  S extends string,
  E extends string,
  G extends string,
  F extends string,
>(
  machine: Machine<S, E, G, F>,
  state: S | 'start',
  event: string,
): Transition<S, E, G, F> | undefined {
  return machine.transitions.find((row) => row.event === event && row.from.includes(state));
}

/** Every transition that leaves `state`. */
export function transitionsFrom<
  S extends string,
  E extends string,
  G extends string,
  F extends string,
>(machine: Machine<S, E, G, F>, state: S | 'start'): readonly Transition<S, E, G, F>[] {
  return machine.transitions.filter((row) => row.from.includes(state));
}
