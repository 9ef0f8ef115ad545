import { ChangeDetectionStrategy, Component, input } from '@angular/core';
import { ReactiveFormsModule } from '@angular/forms';

import { Control } from '../../../ui/field/control';
import { Field } from '../../../ui/field/field';
import type { LaserForm } from './laser-form';

interface Flag {
  readonly name: string;
  readonly words: string;
}

const USES: readonly Flag[] = [
  { name: 'alignmentLaser', words: 'Alignment laser' },
  { name: 'unattended', words: 'Runs unattended' },
  { name: 'outdoor', words: 'Used outdoors' },
  { name: 'teaching', words: 'Used in teaching' },
  { name: 'onPeopleOrAnimals', words: 'Used on people or animals' },
];

const FEATURES: readonly Flag[] = [
  { name: 'keySwitch', words: 'Key switch' },
  { name: 'remoteInterlock', words: 'Remote interlock connector' },
  { name: 'shutter', words: 'Shutter or beam stop' },
  { name: 'emissionIndicator', words: 'Emission indicator' },
  { name: 'emissionDelay', words: 'Emission delay' },
  { name: 'housingInterlock', words: 'Housing interlock' },
  { name: 'manualReset', words: 'Manual reset' },
  { name: 'emergencyStop', words: 'Emergency stop' },
];

/** What a record may say beside the necessary: application, features, authority, in and out. */
@Component({
  selector: 'lm-more-sections',
  imports: [Control, Field, ReactiveFormsModule],
  templateUrl: './more-sections.html',
  styleUrl: './sections.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class MoreSections {
  readonly form = input.required<LaserForm>();
  /** Open, because an error is inside or a link leads there. */
  readonly isOpen = input(false);
  /** The note describes a laser that was found, and is needed. */
  readonly isFound = input(false);

  protected readonly uses = USES;
  protected readonly features = FEATURES;
}
