import type { OfferedEvent } from '@shared/model/lasers';
import type { RecordKind } from '@shared/model/records';
import {
  type Actor as Part,
  findTransition,
  type Machine,
  type Transition,
  transitionsFrom,
} from '@shared/workflow/machine';

import { type Change, recordChange } from '../audit-trail/record-change';
import type { Context } from '../context/context';
import { Conflict, GuardFailed, NotAllowed } from '../http/errors';

/** What a step was given beside its event. */
export interface StepInput {
  readonly reason?: string | undefined;
  readonly comment?: string | undefined;
}

/** What a guard looks at beside the record. */
export interface GuardQuestion<Input> {
  readonly ctx: Context;
  readonly event: string;
  /** Absent when the step is only offered: then what the step will ask for does not count. */
  readonly input: Input | undefined;
}

/** Reasons why a guard does not let a step pass; none when it does. */
export type Guard<Subject, Input> = (
  subject: Subject,
  question: GuardQuestion<Input>,
) => readonly string[];

/**
 * A life cycle at work: the table of `shared/workflow` with the facts and acts behind its words.
 * `Subject` is the record with everything the guards look at, read in the same transaction.
 */
export interface Workflow<
  Subject,
  Input extends StepInput,
  State extends string = string,
  Event extends string = string,
  GuardName extends string = string,
  Effect extends string = string,
> {
  readonly machine: Machine<State, Event, GuardName, Effect>;
  readonly recordKind: RecordKind;
  identify(subject: Subject): { id: string; name: string; state: State | 'start' };
  /** Whether the person who acts has this part in the record. */
  hasPart(part: Part, subject: Subject, ctx: Context): boolean;
  readonly guards: Readonly<Record<GuardName, Guard<Subject, Input>>>;
  /** Writes the new state, nothing else; the effects see it. */
  moveTo(ctx: Context, subject: Subject, to: State): Promise<Subject>;
  readonly effects: Readonly<
    Record<Effect, (ctx: Context, subject: Subject, input: Input) => Promise<Subject>>
  >;
}

interface Step<Subject, Input> {
  readonly subject: Subject;
  readonly event: string;
  readonly input: Input;
  readonly bySystem?: boolean;
  /** Fields that the step writes, for the audit entry. */
  readonly changes?: readonly Change[];
}

type Row = Transition<string, string, string, string>;

/**
 * The only way a state moves. Collects every failing guard, then writes the state, the audit entry
 * and the effects in the transaction that is open.
 */
export async function transition<Subject, Input extends StepInput>(
  ctx: Context,
  workflow: Workflow<Subject, Input>,
  step: Step<Subject, Input>,
): Promise<Subject> {
  const { event, input, bySystem = false } = step;
  const { id, name, state } = workflow.identify(step.subject);
  const row = findTransition(workflow.machine, state, event);
  if (!row) throw new Conflict(`There is no step "${event}" from the state "${state}".`);
  const may = bySystem
    ? row.actors.includes('system')
    : hasAnyPart(ctx, workflow, { subject: step.subject, row });
  if (!may) throw new NotAllowed(`"${row.label}" is for ${row.actors.map(wordsOf).join(', or ')}.`);
  const reasons = failing(workflow, row, {
    subject: step.subject,
    question: { ctx, event, input },
  });
  if (reasons.length > 0) throw new GuardFailed(reasons);

  let subject = await workflow.moveTo(ctx, step.subject, row.to);
  await recordChange(ctx, {
    action: event,
    recordKind: workflow.recordKind,
    recordId: id,
    recordName: name,
    fromState: state === 'start' ? null : state,
    toState: row.to,
    changes: step.changes ?? [],
    reason: input.reason ?? input.comment ?? null,
    bySystem,
  });
  for (const name of row.effects) {
    const effect = of(workflow.effects, name);
    subject = await effect(ctx, subject, input);
  }
  return subject;
}

/** The steps that this person may think of now, each with everything that stands in its way. */
export function offeredEvents<Subject, Input extends StepInput>(
  ctx: Context,
  workflow: Workflow<Subject, Input>,
  subject: Subject,
): OfferedEvent[] {
  return transitionsFrom(workflow.machine, workflow.identify(subject).state)
    .filter((row) => hasAnyPart(ctx, workflow, { subject, row }))
    .map((row) => {
      const question = { ctx, event: row.event, input: undefined };
      const reasons = failing(workflow, row, { subject, question });
      return { event: row.event, label: row.label, reasons, asks: [...(row.asks ?? [])] };
    });
}

function hasAnyPart<Subject, Input extends StepInput>(
  ctx: Context,
  workflow: Workflow<Subject, Input>,
  { subject, row }: { subject: Subject; row: Row },
): boolean {
  return row.actors.some((part) => part !== 'system' && workflow.hasPart(part, subject, ctx));
}

function failing<Subject, Input extends StepInput>(
  workflow: Workflow<Subject, Input>,
  row: Row,
  { subject, question }: { subject: Subject; question: GuardQuestion<Input> },
): string[] {
  const reasons = row.guards.flatMap((name) => of(workflow.guards, name)(subject, question));
  return [...new Set(reasons)];
}

/** What stands behind a word of the table; the type of a workflow asks for every one. */
function of<T>(acts: Readonly<Record<string, T>>, name: string): T {
  const act = acts[name];
  if (!act) throw new Error(`The workflow has nothing for "${name}".`);
  return act;
}

const PART_WORDS: Readonly<Record<Part, string>> = {
  system: 'the product itself',
  lso: 'the laser safety officer',
  'deputy-lso': 'a deputy of the laser safety officer',
  committee: 'the laser safety committee',
  supervisor: 'the supervisor of the area',
  purchasing: 'purchasing',
  author: 'the author of the evaluation',
  checker: 'the checker of the evaluation',
  anyone: 'every signed-in person',
};

function wordsOf(part: Part): string {
  return PART_WORDS[part];
}
