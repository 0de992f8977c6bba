import { provideHttpClient, withFetch, withInterceptors } from '@angular/common/http';
import { type ApplicationConfig, provideBrowserGlobalErrorListeners } from '@angular/core';
import {
  provideRouter,
  TitleStrategy,
  withComponentInputBinding,
  withInMemoryScrolling,
  withNavigationErrorHandler,
} from '@angular/router';
import { routes } from './app.routes';
import { noteUnloadedPage } from './data/unloaded-page';
import { problemInterceptor } from './data/problem-interceptor';
import { renewalInterceptor } from './data/renewal-interceptor';
import { PageTitle } from './page-title';

export const appConfig: ApplicationConfig = {
  providers: [
    provideBrowserGlobalErrorListeners(),
    provideRouter(
      routes,
      withComponentInputBinding(),
      withInMemoryScrolling({ scrollPositionRestoration: 'enabled' }),
      withNavigationErrorHandler(noteUnloadedPage),
    ),
    provideHttpClient(withFetch(), withInterceptors([problemInterceptor, renewalInterceptor])),
    { provide: TitleStrategy, useExisting: PageTitle },
  ],
};
