import { type QueryClient } from '@tanstack/react-query';
import { type ComponentType } from 'react';
import { createBrowserRouter, type LoaderFunctionArgs, redirect, type RouteObject } from 'react-router';
import { meQuery } from './api/me.ts';
import { ProblemError } from './api/request.ts';
import { NotFound } from './app/not-found.tsx';
import { RouteError } from './app/route-error.tsx';
import { startOf } from './app/session.tsx';
import { ShellSkeleton } from './app/shell-skeleton.tsx';

function screen(path: string, lazy: () => Promise<{ Component: ComponentType }>): RouteObject {
  return { path, lazy, ErrorBoundary: RouteError };
}

/** What stands in the frame of a signed-in person. Each screen is a chunk of its own, loaded with its route. */
const SCREENS: RouteObject[] = [
  screen('/sections', () => import('./sections/library/library-page.tsx')),
  screen('/sections/:sectionId', () => import('./sections/editor/editor-page.tsx')),
  screen('/sections/:sectionId/versions/:number', () => import('./versions/version-page.tsx')),
  screen('/compare', () => import('./compare/compare-page.tsx')),
  screen('/cut-sheets', () => import('./cut-sheets/list/list-page.tsx')),
  screen('/cut-sheets/:sheetId', () => import('./cut-sheets/sheet-page.tsx')),
  screen('/cut-sheets/:sheetId/versions/:number', () => import('./cut-sheets/versions/version-page.tsx')),
  screen('/cutting-list', () => import('./cutting-list/cutting-list-page.tsx')),
  screen('/cutting-list/inspect/:sheetId/:number', () => import('./inspections/measure-page.tsx')),
  screen('/inspections', () => import('./inspections/inspections-page.tsx')),
  screen('/inspections/:inspectionId', () => import('./inspections/inspection-page.tsx')),
  screen('/flight-conditions', () => import('./flight-conditions/conditions-page.tsx')),
  screen('/shop', () => import('./shop/shop-page.tsx')),
  screen('/account', () => import('./account/account-page.tsx')),
];

/** The routes: signing in, and behind it the screens. */
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
  const deskOrList = async (args: LoaderFunctionArgs) => {
    const start = startOf(await requireSession(args));
    return start === '/' ? null : redirect(start);
  };

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
            { ...screen('/', () => import('./desk/desk-page.tsx')), loader: deskOrList },
            ...SCREENS,
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
