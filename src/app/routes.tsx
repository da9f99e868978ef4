import { lazy, Suspense } from 'react';
import { Navigate, Route, Routes } from 'react-router-dom';
import { useSuspenseQuery } from '@tanstack/react-query';
import { sessionQuery } from '../lib/session.ts';
import { Doorway, FrameSkeleton } from './doorway.tsx';
import { startOf } from './places.ts';

const SignInPage = lazy(async () => ({ default: (await import('../pages/sign-in.tsx')).SignInPage }));
const SignUpPage = lazy(async () => ({ default: (await import('../pages/sign-up.tsx')).SignUpPage }));
const JoinPage = lazy(async () => ({ default: (await import('../pages/join.tsx')).JoinPage }));
const NotFoundPage = lazy(async () => ({ default: (await import('../pages/not-found.tsx')).NotFoundPage }));
const ShopFrame = lazy(async () => ({ default: (await import('./shop-frame.tsx')).ShopFrame }));
const YearPage = lazy(async () => ({ default: (await import('../pages/year.tsx')).YearPage }));
const WhatPaysPage = lazy(async () => ({ default: (await import('../pages/what-pays.tsx')).WhatPaysPage }));
const OverrunsPage = lazy(async () => ({ default: (await import('../pages/overruns.tsx')).OverrunsPage }));
const TimeToSellPage = lazy(async () => ({ default: (await import('../pages/time-to-sell.tsx')).TimeToSellPage }));
const ContingencyPage = lazy(async () => ({ default: (await import('../pages/contingency.tsx')).ContingencyPage }));
const RebuildsPage = lazy(async () => ({ default: (await import('../pages/rebuilds.tsx')).RebuildsPage }));
const RebuildPage = lazy(async () => ({ default: (await import('../pages/rebuild.tsx')).RebuildPage }));
const LedgerPage = lazy(async () => ({ default: (await import('../pages/ledger.tsx')).LedgerPage }));
const HoursPage = lazy(async () => ({ default: (await import('../pages/hours.tsx')).HoursPage }));
const ImportsPage = lazy(async () => ({ default: (await import('../pages/imports.tsx')).ImportsPage }));
const ImportPage = lazy(async () => ({ default: (await import('../pages/import.tsx')).ImportPage }));
const PeoplePage = lazy(async () => ({ default: (await import('../pages/people.tsx')).PeoplePage }));
const ShopPage = lazy(async () => ({ default: (await import('../pages/shop.tsx')).ShopPage }));

/** Every address and its page. Each page comes in its own file, when its address is first opened. */
export function AppRoutes() {
  return (
    <Suspense fallback={<FrameSkeleton />}>
      <Routes>
        <Route path="/" element={<Start />} />
        <Route element={<Doorway />}>
          <Route path="/sign-in" element={<SignInPage />} />
          <Route path="/sign-up" element={<SignUpPage />} />
          <Route path="/join/:token" element={<JoinPage />} />
          <Route path="*" element={<NotFoundPage />} />
        </Route>
        <Route path="/s/:shopId" element={<ShopFrame />}>
          <Route index element={<Start />} />
          <Route path="year" element={<YearPage />} />
          <Route path="what-pays" element={<WhatPaysPage />} />
          <Route path="overruns" element={<OverrunsPage />} />
          <Route path="time-to-sell" element={<TimeToSellPage />} />
          <Route path="contingency" element={<ContingencyPage />} />
          <Route path="rebuilds" element={<RebuildsPage />} />
          <Route path="rebuilds/:rebuildId" element={<RebuildPage />} />
          <Route path="ledger" element={<LedgerPage />} />
          <Route path="hours" element={<HoursPage />} />
          <Route path="import" element={<ImportsPage />} />
          <Route path="import/:importId" element={<ImportPage />} />
          <Route path="people" element={<PeoplePage />} />
          <Route path="shop" element={<ShopPage />} />
          <Route path="*" element={<NotFoundPage />} />
        </Route>
      </Routes>
    </Suspense>
  );
}

/** Leads to the shop's first page, or to sign-in. */
function Start() {
  const { data: session } = useSuspenseQuery(sessionQuery());
  const to = session ? `/s/${session.shop.id}/${startOf(session.role)}` : '/sign-in';
  return <Navigate to={to} replace />;
}
