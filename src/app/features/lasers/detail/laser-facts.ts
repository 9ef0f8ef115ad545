import { ChangeDetectionStrategy, Component, computed, inject, input } from '@angular/core';
import type { Laser } from '@shared/model/lasers';
import { siteDate } from '@shared/text/site-time';

import { CurrentSession } from '../../../core/session/current-session';
import { fileAddress } from '../lasers-api';

interface Fact {
  readonly what: string;
  readonly text: string;
}

const FEATURES: Readonly<Record<keyof NonNullable<Laser['safetyFeatures']>, string>> = {
  keySwitch: 'key switch',
  remoteInterlock: 'remote interlock connector',
  shutter: 'shutter or beam stop',
  emissionIndicator: 'emission indicator',
  emissionDelay: 'emission delay',
  housingInterlock: 'housing interlock',
  manualReset: 'manual reset',
  emergencyStop: 'emergency stop',
};

const PATHS = { open: 'open', 'limited-open': 'limited open', enclosed: 'enclosed' } as const;

/** What is on record beside the lines. */
@Component({
  selector: 'lm-laser-facts',
  template: `
    <div class="lm-panel">
      <h2 class="lm-unseen">Facts</h2>
      @if (photo(); as file) {
        <figure>
          <img [src]="file.address" [alt]="file.words + ' of ' + laser().tag" />
          <figcaption class="lm-label">{{ file.words }}, {{ file.date }}</figcaption>
        </figure>
      }
      <dl>
        <div>
          <dt>Class</dt>
          <dd>
            @for (entry of classes(); track entry.what) {
              <span class="class">{{ entry.text }}</span> {{ entry.what }}
              @if (!$last) {
                ·
              }
            } @empty {
              not given
            }
          </dd>
        </div>
        @for (fact of facts(); track fact.what) {
          <div>
            <dt>{{ fact.what }}</dt>
            <dd>{{ fact.text }}</dd>
          </div>
        }
      </dl>
    </div>
  `,
  styles: `
    .lm-panel {
      padding-block: 8px;
    }

    dl > div {
      display: grid;
      grid-template-columns: 112px minmax(0, 1fr);
      gap: 8px;
      padding-block: 8px;

      + div {
        border-block-start: 1px solid var(--lm-hair);
      }
    }

    dt {
      color: var(--lm-ink2);
    }

    dd {
      overflow-wrap: anywhere;
      white-space: pre-line;
    }

    figure {
      display: grid;
      gap: 4px;
      padding-block: 8px;
    }

    img {
      inline-size: 100%;
      max-block-size: 240px;
      object-fit: contain;
      background: var(--lm-well);
    }

    .class {
      font: 500 1.0625rem/1.375rem var(--lm-serif);
    }
  `,
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LaserFacts {
  private readonly site = inject(CurrentSession).site;

  readonly laser = input.required<Laser>();

  protected readonly photo = computed(() => {
    const { id, files } = this.laser();
    const file = files.find(({ kind, mediaType }) => kind.endsWith('photo') && isImage(mediaType));
    return (
      file && {
        address: fileAddress(id, file.id),
        words: file.kind === 'photo' ? 'Photograph' : 'Photograph of the label',
        date: this.date(file.uploadedAt),
      }
    );
  });
  protected readonly classes = computed<Fact[]>(() => {
    const { declaredClass, verifiedClass, openClass, serviceClass } = this.laser();
    return present([
      ['declared', declaredClass],
      ['verified', verifiedClass],
      ['opened', openClass],
      ['in service', serviceClass],
    ]);
  });

  protected readonly facts = computed<Fact[]>(() => {
    const laser = this.laser();
    return present([
      ['Serial', laser.serial],
      ['Year', laser.year?.toString()],
      ['Label', laser.labelAsFound],
      ['Standard', standard(laser)],
      ['Supervisor', laser.supervisor?.name ?? 'nobody'],
      ['Alternate', laser.alternate?.name],
      ['Department', laser.department],
      ['Contact', laser.contact],
      ['Place', place(laser)],
      ['Purpose', laser.purpose],
      ['Beam path', laser.beamPath && PATHS[laser.beamPath]],
      ['Has', features(laser, true)],
      ['Has not', features(laser, false)],
      ['Used for', uses(laser)],
      ['In service', this.date(laser.inServiceSince)],
      ['Last used', this.date(laser.lastUsedOn)],
      ['Next use', this.date(laser.nextUseOn)],
      ['Not seen since', this.date(laser.notSeenSince)],
      ['Accession', laser.accession],
      ['Marking', laser.marking],
      ['Registration', laser.registrationNumber],
      ['Asset', laser.assetNumber],
      ['Received', this.date(laser.receivedOn)],
      ['Note', laser.note],
    ]);
  });

  private date(localDate: string | undefined): string | undefined {
    return localDate && siteDate(localDate, this.site()?.zone ?? 'UTC');
  }
}

function isImage(mediaType: string): boolean {
  return mediaType.startsWith('image/');
}

function present(pairs: readonly (readonly [string, string | undefined])[]): Fact[] {
  return pairs.flatMap(([what, text]) => (text ? [{ what, text }] : []));
}

function standard({ declaredStandard, declaredStandardOn }: Laser): string | undefined {
  return [declaredStandard, declaredStandardOn].filter(Boolean).join(', ') || undefined;
}

function place({ area, table, mobile, keyLocation }: Laser): string {
  const parts = [
    area?.code ?? 'in no area',
    table,
    mobile ? 'mobile' : '',
    keyLocation && `key: ${keyLocation}`,
  ];
  return parts.filter(Boolean).join(', ');
}

function features({ safetyFeatures }: Laser, isThere: boolean): string {
  const names = Object.keys(FEATURES) as (keyof typeof FEATURES)[];
  return names
    .filter((name) => safetyFeatures?.[name] === isThere)
    .map((name) => FEATURES[name])
    .join(', ');
}

function uses(laser: Laser): string {
  return [
    laser.alignmentLaser && 'alignment',
    laser.unattended && 'unattended operation',
    laser.outdoor && 'outdoors',
    laser.teaching && 'teaching',
    laser.onPeopleOrAnimals && 'people or animals',
  ]
    .filter(Boolean)
    .join(', ');
}
