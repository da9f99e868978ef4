import { Suspense } from 'react';
import { Navigate, Route, Routes } from 'react-router-dom';
import { useSuspenseQuery } from '@tanstack/react-query';
import { sessionQuery } from '../lib/session.ts';
import { Doorway, FrameSkeleton } from './doorway.tsx';
import { lazyPage } from './lazy-page.tsx';
import { startOf } from './places.ts';

const SignInPage = lazyPage(async () => (await import('../pages/sign-in.tsx')).SignInPage);
const SignUpPage = lazyPage(async () => (await import('../pages/sign-up.tsx')).SignUpPage);
const JoinPage = lazyPage(async () => (await import('../pages/join.tsx')).JoinPage);
const NotFoundPage = lazyPage(async () => (await import('../pages/not-found.tsx')).NotFoundPage);
const ShopFrame = lazyPage(async () => (await import('./shop-frame.tsx')).ShopFrame);
const YearPage = lazyPage(async () => (await import('../pages/year.tsx')).YearPage);
const WhatPaysPage = lazyPage(async () => (await import('../pages/what-pays.tsx')).WhatPaysPage);
const OverrunsPage = lazyPage(async () => (await import('../pages/overruns.tsx')).OverrunsPage);
const TimeToSellPage = lazyPage(async () => (await import('../pages/time-to-sell.tsx')).TimeToSellPage);
const ContingencyPage = lazyPage(async () => (await import('../pages/contingency.tsx')).ContingencyPage);
const RuleReviewPage = lazyPage(async () => (await import('../pages/rule-review.tsx')).RuleReviewPage);
const PreBidPage = lazyPage(async () => (await import('../pages/pre-bid.tsx')).PreBidPage);
const PreBidsPage = lazyPage(async () => (await import('../pages/pre-bids.tsx')).PreBidsPage);
const DefinitionsPage = lazyPage(async () => (await import('../pages/definitions.tsx')).DefinitionsPage);
const RebuildsPage = lazyPage(async () => (await import('../pages/rebuilds.tsx')).RebuildsPage);
const RebuildPage = lazyPage(async () => (await import('../pages/rebuild.tsx')).RebuildPage);
const LedgerPage = lazyPage(async () => (await import('../pages/ledger.tsx')).LedgerPage);
const HoursPage = lazyPage(async () => (await import('../pages/hours.tsx')).HoursPage);
const ImportsPage = lazyPage(async () => (await import('../pages/imports.tsx')).ImportsPage);
const ImportPage = lazyPage(async () => (await import('../pages/import.tsx')).ImportPage);
const DataCheckPage = lazyPage(async () => (await import('../pages/data-check.tsx')).DataCheckPage);
const PeoplePage = lazyPage(async () => (await import('../pages/people.tsx')).PeoplePage);
const ShopPage = lazyPage(async () => (await import('../pages/shop.tsx')).ShopPage);

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
          <Route path="contingency/review" element={<RuleReviewPage />} />
          <Route path="pre-bid/:bidId?" element={<PreBidPage />} />
          <Route path="pre-bids" element={<PreBidsPage />} />
          <Route path="definitions" element={<DefinitionsPage />} />
          <Route path="rebuilds" element={<RebuildsPage />} />
          <Route path="rebuilds/:rebuildId" element={<RebuildPage />} />
          <Route path="ledger" element={<LedgerPage />} />
          <Route path="hours" element={<HoursPage />} />
          <Route path="import" element={<ImportsPage />} />
          <Route path="import/:importId" element={<ImportPage />} />
          <Route path="data-check" element={<DataCheckPage />} />
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
