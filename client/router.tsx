import { type QueryClient } from '@tanstack/react-query';
import { createBrowserRouter, type LoaderFunctionArgs, redirect, type RouteObject } from 'react-router';
import { meQuery } from './api/me.ts';
import { ProblemError } from './api/request.ts';
import { NotFound } from './app/not-found.tsx';
import { RouteError } from './app/route-error.tsx';
import { startOf } from './app/session.tsx';
import { ShellSkeleton } from './app/shell-skeleton.tsx';

/** The screens. Each is a chunk of its own, loaded with its route. */
export function routesOf(client: QueryClient): RouteObject[] {
  const requireSession = async ({ request }: LoaderFunctionArgs) => {
    try {
      return await client.ensureQueryData(meQuery());
    } catch (error) {
      if (!(error instanceof ProblemError) || error.status !== 401) throw error;
      const { pathname, search } = new URL(request.url);
      const to = `${pathname}${search}`;
      throw redirect(to === '/' ? '/sign-in' : `/sign-in?to=${encodeURIComponent(to)}`);
    }
  };
  const toStart = async (args: LoaderFunctionArgs) => redirect(startOf(await requireSession(args)));

  return [
    {
      path: '/sign-in',
      lazy: () => import('./account/sign-in-page.tsx'),
      ErrorBoundary: RouteError,
      HydrateFallback: Nothing,
    },
    {
      loader: requireSession,
      shouldRevalidate: () => false,
      lazy: { Component: async () => (await import('./app/shell.tsx')).Shell },
      HydrateFallback: ShellSkeleton,
      ErrorBoundary: RouteError,
      children: [
        {
          ErrorBoundary: RouteError,
          children: [
            { path: '/', loader: toStart, Component: Nothing },
            {
              path: '/sections',
              lazy: () => import('./sections/library/library-page.tsx'),
              ErrorBoundary: RouteError,
            },
            {
              path: '/sections/:sectionId',
              lazy: () => import('./sections/editor/editor-page.tsx'),
              ErrorBoundary: RouteError,
            },
            {
              path: '/sections/:sectionId/versions/:number',
              lazy: () => import('./versions/version-page.tsx'),
              ErrorBoundary: RouteError,
            },
            { path: '/shop', lazy: () => import('./shop/shop-page.tsx'), ErrorBoundary: RouteError },
            { path: '/account', lazy: () => import('./account/account-page.tsx'), ErrorBoundary: RouteError },
            { path: '*', Component: NotFound },
          ],
        },
      ],
    },
  ];
}

function Nothing() {
  return null;
}

export function createRouter(client: QueryClient) {
  return createBrowserRouter(routesOf(client));
}
