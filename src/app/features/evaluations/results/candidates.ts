import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import type { BeamResult, LimitCandidate, Side } from '@shared/hazard/result';
import { formatFull, formatWavelength } from '@shared/model/quantity-format';
import type { LineView, ResultView } from '@shared/model/result-view';
import { stepValue } from '@shared/model/step-text';
import { durationWords, MECHANISM_WORDS, RULE_WORDS } from '@shared/text/hazard-words';

import { Formula } from '../../../ui/formula/formula';
import { ListTable } from '../../../ui/list-table/list-table';
import { Quantity } from '../../../ui/quantity/quantity';

interface Row {
  readonly candidate: LimitCandidate;
  readonly rule: string;
  readonly read: string;
  readonly governs: boolean;
}

interface Group {
  readonly title: string;
  readonly rows: readonly Row[];
  readonly factors: readonly (readonly [name: string, value: string])[];
}

/** Every limit that was considered, per line and side: which governs, and by which rule. */
@Component({
  selector: 'lm-candidates',
  imports: [Formula, ListTable, Quantity],
  templateUrl: './candidates.html',
  styleUrl: './candidates.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Candidates {
  readonly view = input.required<ResultView>();

  protected readonly groups = computed<Group[]>(() =>
    this.view().lines.flatMap((line) => [groupOf(line, 'eye'), groupOf(line, 'skin')]),
  );
  protected readonly photons = computed(() =>
    this.view().lines.map(({ eye }) => ({
      wavelength: formatWavelength(eye.wavelengthNm).text,
      energy: `${stepValue({ value: eye.photonEnergyJ })}\u202fJ (${eye.photonEnergyEv.toPrecision(6)}\u202feV)`,
      frequency: formatFull(eye.frequencyHz, 'Hz'),
    })),
  );
}

function groupOf(line: LineView, side: Side): Group {
  const result = line[side];
  const candidates = result.mpe.candidates ?? [];
  const governing = governingOf(result, candidates);
  return {
    title: `${formatWavelength(line.beam.wavelengthNm).text}, ${side}`,
    rows: candidates.map((candidate) => ({
      candidate,
      rule: `${RULE_WORDS[candidate.rule]}, ${MECHANISM_WORDS[candidate.mechanism]}`,
      read: `at ${durationWords(candidate.durationS)}, over ${candidate.limitingApertureMm}\u202fmm`,
      governs: candidate === governing,
    })),
    factors: Object.entries(result.mpe.factors).map(([name, value]) => [
      name,
      String(Number((value as number).toPrecision(6))),
    ]),
  };
}

/** The largest exposure in terms of its limit governs; the limit itself names it. */
function governingOf(
  { mpe }: BeamResult,
  candidates: readonly LimitCandidate[],
): LimitCandidate | undefined {
  const named = candidates.filter(
    ({ rule, mechanism }) => rule === mpe.rule && mechanism === mpe.mechanism,
  );
  return named.reduce<LimitCandidate | undefined>(
    (most, one) => (!most || one.exposureToLimit > most.exposureToLimit ? one : most),
    undefined,
  );
}
