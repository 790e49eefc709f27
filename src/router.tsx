import type { ComponentType } from 'react';
import { createBrowserRouter } from 'react-router-dom';
import type { RouteObject } from 'react-router-dom';
import { RequireSession } from './features/session/components/RequireSession.tsx';
import { paths } from './lib/paths.ts';
import { AppLayout } from './routes/layout/AppLayout.tsx';
import { RouteError } from './routes/layout/RouteError.tsx';
import { StartingUp } from './routes/layout/StartingUp.tsx';

/** A page whose code is fetched when it is first opened. */
function page(path: string, load: () => Promise<ComponentType>): RouteObject {
  return { path, lazy: async () => ({ Component: await load() }) };
}

/** Open to everybody. */
const openPages = [
  page(paths.signIn, async () => (await import('./routes/signIn/SignInPage.tsx')).SignInPage),
  page(paths.signUp, async () => (await import('./routes/signUp/SignUpPage.tsx')).SignUpPage),
  page(
    paths.forgotPassword,
    async () => (await import('./routes/forgotPassword/ForgotPasswordPage.tsx')).ForgotPasswordPage,
  ),
  page(
    paths.resetPassword,
    async () => (await import('./routes/resetPassword/ResetPasswordPage.tsx')).ResetPasswordPage,
  ),
  page(
    paths.conventions,
    async () => (await import('./routes/conventions/ConventionsPage.tsx')).ConventionsPage,
  ),
  page(paths.mails, async () => (await import('./routes/mails/MailsPage.tsx')).MailsPage),
  page(paths.share, async () => (await import('./routes/share/SharePage.tsx')).SharePage),
  page('*', async () => (await import('./routes/notFound/NotFoundPage.tsx')).NotFoundPage),
];

/** Behind the sign-in. */
const groupPages = [
  page(paths.start, async () => (await import('./routes/start/StartPage.tsx')).StartPage),
  page(paths.groupHome, async () => (await import('./routes/groupHome/GroupHomePage.tsx')).GroupHomePage),
  page(paths.runs, async () => (await import('./routes/runs/RunsPage.tsx')).RunsPage),
  page(
    paths.compareRuns,
    async () => (await import('./routes/compareRuns/CompareRunsPage.tsx')).CompareRunsPage,
  ),
  page(paths.materials, async () => (await import('./routes/materials/MaterialsPage.tsx')).MaterialsPage),
  page(
    paths.compareMaterials,
    async () => (await import('./routes/compareMaterials/CompareMaterialsPage.tsx')).CompareMaterialsPage,
  ),
  page(
    paths.importMaterial,
    async () => (await import('./routes/importMaterial/ImportMaterialPage.tsx')).ImportMaterialPage,
  ),
  page(
    paths.newMaterial,
    async () => (await import('./routes/editMaterial/NewMaterialPage.tsx')).NewMaterialPage,
  ),
  page(
    paths.editMaterial,
    async () => (await import('./routes/editMaterial/EditMaterialPage.tsx')).EditMaterialPage,
  ),
  page(paths.people, async () => (await import('./routes/people/PeoplePage.tsx')).PeoplePage),
  page(paths.account, async () => (await import('./routes/account/AccountPage.tsx')).AccountPage),
  page(paths.material, async () => (await import('./routes/material/MaterialPage.tsx')).MaterialPage),
  page(paths.stack, async () => (await import('./routes/stack/StackPage.tsx')).StackPage),
  page(paths.newCard, async () => (await import('./routes/newCard/NewCardPage.tsx')).NewCardPage),
  page(paths.card, async () => (await import('./routes/card/CardPage.tsx')).CardPage),
  page(paths.studies, async () => (await import('./routes/studies/StudiesPage.tsx')).StudiesPage),
  page(paths.study, async () => (await import('./routes/study/StudyPage.tsx')).StudyPage),
  page(paths.designs, async () => (await import('./routes/designs/DesignsPage.tsx')).DesignsPage),
  page(paths.newDesign, async () => (await import('./routes/newDesign/NewDesignPage.tsx')).NewDesignPage),
  page(paths.design, async () => (await import('./routes/design/DesignPage.tsx')).DesignPage),
  page(paths.run, async () => (await import('./routes/run/RunPage.tsx')).RunPage),
];

export function createRouter() {
  return createBrowserRouter([
    {
      Component: AppLayout,
      HydrateFallback: StartingUp,
      children: [
        {
          ErrorBoundary: RouteError,
          children: [...openPages, { Component: RequireSession, children: groupPages }],
        },
      ],
    },
  ]);
}
