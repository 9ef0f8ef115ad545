import { ChangeDetectionStrategy, Component, computed, input } from '@angular/core';
import { beamOf } from '@shared/model/emission-beam';
import { type EmissionFigure, emissionFigures } from '@shared/model/emission-figures';
import { lineName } from '@shared/model/laser-inputs';
import type { Emission, Laser } from '@shared/model/lasers';

import { LineSwatch } from '../../../ui/line-swatch/line-swatch';

interface LineView {
  readonly id: string;
  readonly swatch: readonly { wavelengthNm: number; wavelengthToNm?: number }[];
  readonly label: string;
  readonly figures: readonly EmissionFigure[];
  readonly notes: readonly string[];
}

/** Every line as it was entered, with where each number came from and what is made of it. */
@Component({
  selector: 'lm-laser-lines',
  imports: [LineSwatch],
  templateUrl: './laser-lines.html',
  styleUrl: './laser-lines.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LaserLines {
  readonly laser = input.required<Laser>();

  protected readonly lines = computed(() => this.laser().emissions.map(viewOf));
  protected readonly sets = computed(() => {
    const { emissions, emissionSets } = this.laser();
    return emissionSets.map(({ name, emissionIds }) => ({
      name,
      lines: emissions
        .filter(({ id }) => emissionIds.includes(id))
        .map(lineName)
        .join(' + '),
    }));
  });
}

function viewOf(emission: Emission): LineView {
  const { id, label, wavelengthNm, wavelengthToNm } = emission;
  const swatch = {
    wavelengthNm: wavelengthNm.value,
    ...(wavelengthToNm && { wavelengthToNm: wavelengthToNm.value }),
  };
  return {
    id,
    swatch: [swatch],
    label: label ?? '',
    figures: emissionFigures(emission).filter(({ what }) => what !== 'Wavelength'),
    notes: notesOf(emission),
  };
}

function notesOf(emission: Emission): readonly string[] {
  const beam = beamOf(emission, emission.wavelengthToNm && emission.wavelengthNm.value);
  if (!beam.ok) return beam.errors.map(({ message }) => `Not enough for an evaluation: ${message}`);
  // Which wavelength of a tuning range counts is decided in the evaluation.
  return [
    ...beam.conversions,
    ...beam.assumptions.filter((note) => !note.startsWith('Evaluated at')),
  ];
}
