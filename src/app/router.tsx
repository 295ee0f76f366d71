// One lazy module per URL. A page module exports `Component`.
import type { ComponentType } from 'react';
import { createBrowserRouter, type RouteObject } from 'react-router-dom';
import { DoorLayout } from './door-layout';
import { PageFault } from './page-fault';
import { PaperLayout } from './paper-layout';
import { RootLayout } from './root-layout';
import { SignedIn } from './signed-in';

interface PageModule {
  readonly Component: ComponentType;
}

const notFound = () => import('../pages/not-found-page');

/** Pages with three.js in them, each a module of its own; found by file name, and a 404 where there is none. */
const drawn = import.meta.glob<PageModule>([
  '../pages/bench-page.tsx',
  '../pages/dry-fits-page.tsx',
  '../pages/report-page.tsx',
  '../pages/share-page.tsx',
]);
const drawnPage = (name: string): (() => Promise<PageModule>) => drawn[`../pages/${name}.tsx`] ?? notFound;

const door: RouteObject[] = [
  { path: '/sign-in', lazy: () => import('../pages/sign-in-page') },
  { path: '/sign-up', lazy: () => import('../pages/sign-up-page') },
  { path: '/check-mail', lazy: () => import('../pages/check-mail-page') },
  { path: '/confirmed', lazy: () => import('../pages/confirmed-page') },
  { path: '/forgotten', lazy: () => import('../pages/forgotten-page') },
  { path: '/reset', lazy: () => import('../pages/reset-page') },
];

const paper: RouteObject[] = [
  { path: '/', lazy: () => import('../pages/home-page') },
  { path: '/invitation/:invitationId', lazy: () => import('../pages/invitation-page') },
  { path: '/teams/:teamId', lazy: () => import('../pages/projects-page') },
  { path: '/teams/:teamId/people', lazy: () => import('../pages/people-page') },
  { path: '/teams/:teamId/meshes', lazy: () => import('../pages/meshes-page') },
  { path: '/projects/:projectId', lazy: () => import('../pages/project-page') },
  { path: '/account', lazy: () => import('../pages/account-page') },
  { path: '/scenes/:sceneId/dry-fits', lazy: drawnPage('dry-fits-page') },
  { path: '/revisions/:revisionId/report', lazy: drawnPage('report-page') },
];

/** The bench fills the window by itself. */
const bench: RouteObject[] = [{ path: '/scenes/:sceneId', lazy: drawnPage('bench-page') }];
const shared: RouteObject[] = [{ path: '/s/:token', lazy: drawnPage('share-page') }];

const open: RouteObject[] = [
  { path: '/mail', lazy: () => import('../pages/mail-page') },
  { path: '/help/cautions', lazy: () => import('../pages/cautions-page') },
  { path: '*', lazy: notFound },
];

/** Every layout catches the faults of the pages in it, so that its head stays. */
const within = (Layout: ComponentType, children: RouteObject[]): RouteObject => ({
  Component: Layout,
  children: [{ errorElement: <PageFault />, children }],
});
const alone = (children: RouteObject[]): RouteObject => ({ errorElement: <PageFault bare />, children });

export const router = createBrowserRouter([
  {
    Component: RootLayout,
    errorElement: <PageFault bare />,
    // while the first page's module loads, the plain ground shows
    hydrateFallbackElement: <div />,
    children: [
      within(DoorLayout, door),
      { Component: SignedIn, children: [within(PaperLayout, paper), alone(bench)] },
      alone(shared),
      within(PaperLayout, open),
    ],
  },
]);
