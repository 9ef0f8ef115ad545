import {
  afterNextRender,
  ChangeDetectionStrategy,
  Component,
  computed,
  type ElementRef,
  inject,
  Injector,
  signal,
  viewChild,
} from '@angular/core';
import { takeUntilDestroyed } from '@angular/core/rxjs-interop';
import { MatButton } from '@angular/material/button';
import { NavigationEnd, Router, RouterLink, RouterLinkActive, RouterOutlet } from '@angular/router';
import { scopeOf } from '@shared/permissions/permissions';
import { filter, skip } from 'rxjs';

import { Icon } from '../../ui/icon/icon';
import { ProblemPanel } from '../../ui/problem-panel/problem-panel';
import { UnhandledProblem } from '../app-error-handler';
import { CurrentSession } from '../session/current-session';
import { SessionClock } from '../session/session-clock';
import { SessionRenewal } from '../session/session-renewal';
import { SessionExpired } from '../session/session-expired';
import { LaserSearch } from './laser-search';
import { DESTINATIONS, HELP } from './navigation';
import { UserBlock } from './user-block';
import { WaitingCount } from './waiting-count';
import { WordMark } from './word-mark';

/** The frame of every page behind the sign-in: spine, search, content. */
@Component({
  selector: 'lm-shell',
  imports: [
    Icon,
    LaserSearch,
    MatButton,
    ProblemPanel,
    RouterLink,
    RouterLinkActive,
    RouterOutlet,
    SessionExpired,
    UserBlock,
    WordMark,
  ],
  templateUrl: './shell.html',
  styleUrl: './shell.scss',
  host: { '(keydown.escape)': 'menuOpen.set(false)' },
  changeDetection: ChangeDetectionStrategy.OnPush,
})
export class Shell {
  private readonly router = inject(Router);
  private readonly injector = inject(Injector);
  private readonly session = inject(CurrentSession);
  protected readonly unhandled = inject(UnhandledProblem);
  protected readonly renewal = inject(SessionRenewal);
  protected readonly clock = inject(SessionClock);
  protected readonly waiting = inject(WaitingCount);

  private readonly search = viewChild.required(LaserSearch);
  private readonly main = viewChild.required<ElementRef<HTMLElement>>('main');

  /** Only what the person's roles open; the server decides anyway. */
  protected readonly destinations = computed(() => {
    const roles = this.session.user()?.roles ?? [];
    return [...DESTINATIONS, HELP].filter(({ action }) => scopeOf(action, roles) !== undefined);
  });
  protected readonly menuOpen = signal(false);
  /** On narrow screens, where the search is not always there. */
  protected readonly searchOpen = signal(false);

  constructor() {
    // A new page starts reading at its content; a changed filter in the URL does not.
    this.router.events
      .pipe(
        filter((event) => event instanceof NavigationEnd),
        skip(1),
        takeUntilDestroyed(),
      )
      .subscribe((event) => this.afterNavigation(event));
  }

  protected openSearch(): void {
    this.searchOpen.set(true);
    afterNextRender(() => this.search().focus(), { injector: this.injector });
  }

  protected skipToContent(event: Event): void {
    event.preventDefault();
    this.main().nativeElement.focus();
  }

  private path = pathOf(this.router.url);

  private afterNavigation(event: NavigationEnd): void {
    this.menuOpen.set(false);
    this.searchOpen.set(false);
    this.unhandled.dismiss();
    const path = pathOf(event.urlAfterRedirects);
    if (path === this.path) return;
    this.path = path;
    afterNextRender(() => this.main().nativeElement.focus({ preventScroll: true }), {
      injector: this.injector,
    });
  }
}

function pathOf(url: string): string {
  return url.split(/[?#]/)[0] ?? '';
}
