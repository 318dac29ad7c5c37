import { lazy } from "react";
import { Route, Routes } from "react-router-dom";
import { ShedPage } from "../features/shed/shed-page.tsx";
import { patterns } from "../ui/paths.ts";
import { Layout } from "./layout.tsx";
import { NotFoundPage } from "./not-found-page.tsx";
import { RequireAccount } from "./require-account.tsx";

// The Shed is the first paint; every other screen loads when it is first opened, or before, by
// the service worker.
const NewBikePage = lazy(() => import("../features/shed/new-bike-page.tsx"));
const BikeRoutes = lazy(() => import("../features/bike/index.tsx"));
const CheckPage = lazy(() => import("../features/check/index.tsx"));
const StationPage = lazy(() => import("../features/check/station/station-page.tsx"));
const ClubsPage = lazy(() => import("../features/club/clubs-page.tsx"));
const ClubRoutes = lazy(() => import("../features/club/index.tsx"));
const SharePage = lazy(() => import("../features/club/share/share-page.tsx"));
const JoinPage = lazy(() => import("../features/club/join-page.tsx"));
const SyringesPage = lazy(() => import("../features/syringes/index.tsx"));
const AccountPage = lazy(() => import("../features/account/account-page.tsx"));
const ChangeEmailPage = lazy(() => import("../features/account/change-email-page.tsx"));
const ChangePasswordPage = lazy(() => import("../features/account/change-password-page.tsx"));
const DevicesPage = lazy(() => import("../features/account/devices-page.tsx"));
const OwnDataPage = lazy(() => import("../features/account/own-data-page.tsx"));
const DeleteAccountPage = lazy(() => import("../features/account/delete-account-page.tsx"));
const SignInPage = lazy(() => import("../features/account/sign-in-page.tsx"));
const SignUpPage = lazy(() => import("../features/account/sign-up-page.tsx"));
const ForgotPage = lazy(() => import("../features/account/forgot-page.tsx"));
const ResetPage = lazy(() => import("../features/account/reset-page.tsx"));
const VerifyPage = lazy(() => import("../features/account/verify-page.tsx"));
const UnsubscribePage = lazy(() => import("../features/account/unsubscribe-page.tsx"));

export function AppRoutes() {
  return (
    <Routes>
      <Route element={<Layout />}>
        <Route element={<RequireAccount />}>
          <Route path={patterns.shed} element={<ShedPage />} />
          <Route path={patterns.newBike} element={<NewBikePage />} />
          <Route path={patterns.check} element={<CheckPage />} />
          <Route path={patterns.bike} element={<BikeRoutes />} />
          <Route path={patterns.share} element={<SharePage />} />
          <Route path={patterns.clubs} element={<ClubsPage />} />
          <Route path={patterns.testDayBike} element={<StationPage />} />
          <Route path={patterns.club} element={<ClubRoutes />} />
          <Route path={patterns.syringes} element={<SyringesPage />} />
          <Route path={patterns.account} element={<AccountPage />} />
          <Route path={patterns.changeEmail} element={<ChangeEmailPage />} />
          <Route path={patterns.changePassword} element={<ChangePasswordPage />} />
          <Route path={patterns.devices} element={<DevicesPage />} />
          <Route path={patterns.ownData} element={<OwnDataPage />} />
          <Route path={patterns.deleteAccount} element={<DeleteAccountPage />} />
        </Route>
        <Route path={patterns.signIn} element={<SignInPage />} />
        <Route path={patterns.signUp} element={<SignUpPage />} />
        <Route path={patterns.forgot} element={<ForgotPage />} />
        <Route path={patterns.reset} element={<ResetPage />} />
        <Route path={patterns.verify} element={<VerifyPage />} />
        <Route path={patterns.unsubscribe} element={<UnsubscribePage />} />
        <Route path={patterns.join} element={<JoinPage />} />
        <Route path="*" element={<NotFoundPage />} />
      </Route>
    </Routes>
  );
}
