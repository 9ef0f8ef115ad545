import { APP_BASE_HREF } from '@angular/common';
import { provideHttpClient, withInterceptors, withXsrfConfiguration } from '@angular/common/http';
import {
  type ApplicationConfig,
  ErrorHandler,
  inject,
  provideAppInitializer,
  provideBrowserGlobalErrorListeners,
  provideZonelessChangeDetection,
} from '@angular/core';
import {
  provideRouter,
  TitleStrategy,
  withComponentInputBinding,
  withInMemoryScrolling,
} from '@angular/router';

import { APP_ROUTES } from './app-routes';
import { AppErrorHandler } from './core/app-error-handler';
import { PageTitleStrategy } from './core/page-title-strategy';
import { problemInterceptor } from './core/http/problem-interceptor';
import { sessionInterceptor } from './core/session/session-interceptor';
import { CurrentSession } from './core/session/current-session';

export const appConfig: ApplicationConfig = {
  providers: [
    provideZonelessChangeDetection(),
    provideBrowserGlobalErrorListeners(),
    { provide: ErrorHandler, useClass: AppErrorHandler },
    // The content security policy forbids a <base> element.
    { provide: APP_BASE_HREF, useValue: '/' },
    provideRouter(
      APP_ROUTES,
      withComponentInputBinding(),
      withInMemoryScrolling({ scrollPositionRestoration: 'enabled', anchorScrolling: 'enabled' }),
    ),
    { provide: TitleStrategy, useClass: PageTitleStrategy },
    provideHttpClient(
      withXsrfConfiguration({ cookieName: 'XSRF-TOKEN', headerName: 'X-XSRF-TOKEN' }),
      withInterceptors([sessionInterceptor, problemInterceptor]),
    ),
    provideAppInitializer(() => inject(CurrentSession).load()),
  ],
};
