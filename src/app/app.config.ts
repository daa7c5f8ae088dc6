import { APP_BASE_HREF } from '@angular/common';
import { provideHttpClient, withInterceptors, withXsrfConfiguration } from '@angular/common/http';
import { inject, provideAppInitializer, provideBrowserGlobalErrorListeners } from '@angular/core';
import type { ApplicationConfig } from '@angular/core';
import { TitleStrategy, provideRouter, withComponentInputBinding, withInMemoryScrolling } from '@angular/router';
import { appRoutes } from './app.routes';
import { sessionInterceptor } from './session/session-interceptor';
import { SessionStore } from './session/session-store';
import { SheetTitle } from './shell/sheet-title';
import { Theme } from './ui/theme';

export const appConfig: ApplicationConfig = {
  providers: [
    provideBrowserGlobalErrorListeners(),
    provideRouter(appRoutes, withComponentInputBinding(), withInMemoryScrolling({ scrollPositionRestoration: 'top' })),
    provideHttpClient(withInterceptors([sessionInterceptor]), withXsrfConfiguration({ cookieName: 'XSRF-TOKEN', headerName: 'X-XSRF-TOKEN' })),
    // The page has no base element: its policy forbids one, since an injected base could send every script elsewhere.
    { provide: APP_BASE_HREF, useValue: '/' },
    { provide: TitleStrategy, useClass: SheetTitle },
    provideAppInitializer(() => {
      inject(Theme).apply();
      return inject(SessionStore).load();
    }),
  ],
};
