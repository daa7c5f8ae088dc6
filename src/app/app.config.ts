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
    { provide: TitleStrategy, useClass: SheetTitle },
    provideAppInitializer(() => {
      inject(Theme).apply();
      return inject(SessionStore).load();
    }),
  ],
};
