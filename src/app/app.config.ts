import { APP_BASE_HREF } from '@angular/common';
import { provideHttpClient, withFetch, withXsrfConfiguration } from '@angular/common/http';
import { type ApplicationConfig, provideBrowserGlobalErrorListeners } from '@angular/core';
import {
  TitleStrategy,
  provideRouter,
  withComponentInputBinding,
  withInMemoryScrolling,
} from '@angular/router';
import { routes } from './app.routes';
import { PageTitle } from './shell/page-title';
import { xsrfCookieName } from './xsrf-cookie';

export const appConfig: ApplicationConfig = {
  providers: [
    provideBrowserGlobalErrorListeners(),
    provideRouter(
      routes,
      withComponentInputBinding(),
      withInMemoryScrolling({ scrollPositionRestoration: 'enabled', anchorScrolling: 'enabled' }),
    ),
    provideHttpClient(
      withFetch(),
      withXsrfConfiguration({
        cookieName: xsrfCookieName(document),
        headerName: 'X-XSRF-TOKEN',
      }),
    ),
    // There is no <base> element: the content security policy forbids one.
    { provide: APP_BASE_HREF, useValue: '/' },
    { provide: TitleStrategy, useExisting: PageTitle },
  ],
};
