import type { QueryClient } from '@tanstack/react-query';
import { createBrowserRouter, redirect, type RouteObject } from 'react-router-dom';
import type { Role } from '../../shared/api/roles';
import { sessionQuery } from '../api/session';
import { paths } from '../lib/paths';
import { AppLayout } from './layouts/app-layout';
import { ErrorPage } from './error-page';
import { LoadingPage } from './loading-page';

const authors: readonly Role[] = ['educator', 'technician', 'administrator'];

/** Lets a page open for these roles only: others are sent to sign in, or told so on the page. */
function only(queryClient: QueryClient, roles: readonly Role[]) {
  return async ({ request }: { request: Request }) => {
    const user = await queryClient.ensureQueryData(sessionQuery);
    const url = new URL(request.url);
    if (!user) throw redirect(paths.signIn(url.pathname + url.search + url.hash));
    if (!roles.includes(user.role)) throw new Response('notAllowed', { status: 403 });
    return null;
  };
}

/** Where somebody starts: those who make strips at the strips, others at the recorder bench. */
function startPage(queryClient: QueryClient) {
  return async () => {
    const user = await queryClient.ensureQueryData(sessionQuery);
    return redirect(user && authors.includes(user.role) ? paths.strips() : paths.recorder());
  };
}

/** Every address that no page has. */
function notFound(): never {
  throw new Response('notFound', { status: 404 });
}

function routes(queryClient: QueryClient): RouteObject[] {
  const forAuthors = only(queryClient, authors);
  return [
    {
      path: '/sign-in',
      lazy: () => import('../pages/sign-in-page'),
      ErrorBoundary: ErrorPage,
      HydrateFallback: LoadingPage,
    },
    {
      Component: AppLayout,
      ErrorBoundary: ErrorPage,
      HydrateFallback: LoadingPage,
      loader: only(queryClient, ['educator', 'technician', 'learner', 'administrator']),
      children: [
        {
          ErrorBoundary: ErrorPage,
          children: [
            { index: true, loader: startPage(queryClient) },
            { path: 'strips', loader: forAuthors, lazy: () => import('../pages/strip-library-page') },
            { path: 'strips/new', loader: forAuthors, lazy: () => import('../pages/strip-editor-page') },
            { path: 'strips/:stripId', loader: forAuthors, lazy: () => import('../pages/strip-editor-page') },
            { path: 'exports', loader: forAuthors, lazy: () => import('../pages/exports-page') },
            {
              path: 'strips/:stripId/sheet',
              loader: forAuthors,
              lazy: () => import('../pages/strip-sheet-page'),
            },
            { path: 'recorder', lazy: () => import('../pages/recorder-page') },
            { path: 'help', lazy: () => import('../pages/help-page') },
            { path: '*', Component: LoadingPage, loader: notFound },
          ],
        },
      ],
    },
  ];
}

export function createRouter(queryClient: QueryClient) {
  return createBrowserRouter(routes(queryClient));
}
