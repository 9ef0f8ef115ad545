import { HttpEventType } from '@angular/common/http';
import {
  ChangeDetectionStrategy,
  Component,
  DestroyRef,
  type ElementRef,
  inject,
  input,
  output,
  signal,
  viewChild,
} from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { MatButton } from '@angular/material/button';
import {
  LASER_FILE_KINDS,
  type LaserFile,
  laserFileKindSchema,
  MAX_FILE_BYTES,
  MAX_FILES_PER_LASER,
} from '@shared/model/files';
import type { Laser } from '@shared/model/lasers';
import type { Problem } from '@shared/model/problem';
import { filter, type Subscription, switchMap } from 'rxjs';

import { asProblem, problemError } from '../../../core/http/problem-error';
import { InstantPipe } from '../../../core/time/instant-pipe';
import { ConfirmDialog } from '../../../ui/confirm-dialog/confirm-dialog';
import { Icon } from '../../../ui/icon/icon';
import { ProblemPanel } from '../../../ui/problem-panel/problem-panel';
import { fileAddress, LasersApi } from '../lasers-api';

type Kind = LaserFile['kind'];

const KIND_WORDS: Readonly<Record<Kind, string>> = {
  'data-sheet': 'Data sheet',
  photo: 'Photograph',
  'label-photo': 'Photograph of the label',
  manual: 'Manual',
  declaration: 'Declaration of conformity',
  'measurement-report': 'Measurement report',
};

/** Data sheets and photographs of the laser: add, open, remove. */
@Component({
  selector: 'lm-laser-files',
  imports: [Icon, InstantPipe, MatButton, ProblemPanel],
  templateUrl: './laser-files.html',
  styleUrl: './laser-files.scss',
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class LaserFiles {
  private readonly api = inject(LasersApi);
  private readonly confirm = inject(ConfirmDialog);
  private readonly destroyRef = inject(DestroyRef);
  private readonly chooser = viewChild<ElementRef<HTMLInputElement>>('chooser');

  readonly laser = input.required<Laser>();

  readonly changed = output();

  protected readonly kinds = LASER_FILE_KINDS.map((kind) => ({ kind, words: KIND_WORDS[kind] }));
  protected readonly kindWords = KIND_WORDS;
  protected readonly most = MAX_FILES_PER_LASER;
  protected readonly kind = signal<Kind>('data-sheet');
  protected readonly note = signal('');
  protected readonly problem = signal<Problem | null>(null);
  /** Percent sent, while a file is on its way. */
  protected readonly sent = signal<number | null>(null);
  protected readonly said = signal('');
  private upload: Subscription | undefined;

  protected address(file: LaserFile): string {
    return fileAddress(this.laser().id, file.id);
  }

  protected size({ sizeBytes }: LaserFile): string {
    if (sizeBytes < 1024 * 1024) return `${Math.ceil(sizeBytes / 1024)}\u202fkB`;
    return `${(sizeBytes / 1024 / 1024).toFixed(1)}\u202fMB`;
  }

  protected chooseKind(text: string): void {
    this.kind.set(laserFileKindSchema.parse(text));
  }

  protected attach(file: File | null | undefined): void {
    if (!file || this.sent() !== null) return;
    this.said.set('');
    this.problem.set(null);
    if (file.size > MAX_FILE_BYTES) {
      this.problem.set(tooLarge(file));
      return;
    }
    this.sent.set(0);
    this.upload = this.api
      .attach(this.laser().id, file, { kind: this.kind(), note: this.note().trim() })
      .pipe(takeUntilDestroyed(this.destroyRef))
      .subscribe({
        next: (event) => {
          if (event.type === HttpEventType.UploadProgress && event.total) {
            this.sent.set(Math.round((100 * event.loaded) / event.total));
          }
          if (event.type === HttpEventType.Response) this.finish(`${file.name} is attached.`);
        },
        error: (error: unknown) => {
          this.sent.set(null);
          this.problem.set(asProblem(error));
        },
      });
  }

  protected cancel(): void {
    this.upload?.unsubscribe();
    this.sent.set(null);
    this.said.set('Canceled; nothing was stored.');
  }

  protected remove(file: LaserFile): void {
    this.confirm
      .ask({
        title: `Remove ${file.name}?`,
        text: 'The file is taken off this laser. The history keeps that it was here.',
        action: 'Remove the file',
      })
      .pipe(
        filter((answer) => answer !== null),
        switchMap(() => this.api.removeFile(this.laser().id, file.id)),
        takeUntilDestroyed(this.destroyRef),
      )
      .subscribe({
        next: () => this.finish(`${file.name} is removed.`),
        error: (error: unknown) => this.problem.set(asProblem(error)),
      });
  }

  private finish(sentence: string): void {
    this.sent.set(null);
    this.note.set('');
    this.said.set(sentence);
    const chooser = this.chooser()?.nativeElement;
    if (chooser) chooser.value = '';
    this.changed.emit();
  }
}

function tooLarge(file: File): Problem {
  const most = MAX_FILE_BYTES / 1024 / 1024;
  return problemError('too-large', `${file.name} is larger than ${most} MB.`).problem;
}
