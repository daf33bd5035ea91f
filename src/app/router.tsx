import { lazy, type ComponentType } from 'react';
import { BrowserRouter, Route, Routes } from 'react-router-dom';
import { DaybreakPage } from '../features/daybreak/pages/daybreak-page.tsx';
import { FarmGate } from './farm-gate.tsx';
import { Home } from './home.tsx';
import { FarmLayout, PlainLayout } from './layout.tsx';
import { SignedIn } from './signed-in.tsx';
import { NotFoundPage } from './states.tsx';

/** A page in a chunk of its own, by the name it is exported under. */
function page<Name extends string>(load: () => Promise<Record<Name, ComponentType>>, name: Name) {
  return lazy(async () => ({ default: (await load())[name] }));
}

const SignInPage = page(() => import('../features/account/pages/sign-in-page.tsx'), 'SignInPage');
const SignUpPage = page(() => import('../features/account/pages/sign-up-page.tsx'), 'SignUpPage');
const ConfirmPage = page(() => import('../features/account/pages/confirm-page.tsx'), 'ConfirmPage');
const ForgotPage = page(() => import('../features/account/pages/forgot-page.tsx'), 'ForgotPage');
const ResetPage = page(() => import('../features/account/pages/reset-page.tsx'), 'ResetPage');
const InvitationPage = page(() => import('../features/account/pages/invitation-page.tsx'), 'InvitationPage');
const AccountPage = page(() => import('../features/account/pages/account-page.tsx'), 'AccountPage');
const FirstRunPage = page(() => import('../features/first-run/pages/first-run-page.tsx'), 'FirstRunPage');
const MorningPage = page(() => import('../features/mornings/pages/morning-page.tsx'), 'MorningPage');
const PlansPage = page(() => import('../features/plans/pages/plans-page.tsx'), 'PlansPage');
const PlanPage = page(() => import('../features/plans/pages/plan-page.tsx'), 'PlanPage');
const editPlan = () => import('../features/plans/pages/edit-plan-pages.tsx');
const NewPlanPage = page(editPlan, 'NewPlanPage');
const EditPlanPage = page(editPlan, 'EditPlanPage');
const ShelfPage = page(() => import('../features/shelf/pages/shelf-page.tsx'), 'ShelfPage');
const ProductPage = page(() => import('../features/shelf/pages/product-page.tsx'), 'ProductPage');
const editProduct = () => import('../features/shelf/pages/edit-product-pages.tsx');
const NewProductPage = page(editProduct, 'NewProductPage');
const EditProductPage = page(editProduct, 'EditProductPage');
const FarmPage = page(() => import('../features/farms/pages/farm-page.tsx'), 'FarmPage');
const EditFarmPage = page(() => import('../features/farms/pages/edit-farm-page.tsx'), 'EditFarmPage');
const BlockPage = page(() => import('../features/farms/pages/block-page.tsx'), 'BlockPage');
const editBlock = () => import('../features/farms/pages/edit-block-pages.tsx');
const NewBlockPage = page(editBlock, 'NewBlockPage');
const EditBlockPage = page(editBlock, 'EditBlockPage');
const PlacePage = page(() => import('../features/farms/pages/place-page.tsx'), 'PlacePage');
const editPlace = () => import('../features/farms/pages/edit-place-pages.tsx');
const NewPlacePage = page(editPlace, 'NewPlacePage');
const EditPlacePage = page(editPlace, 'EditPlacePage');
const SprayerPage = page(() => import('../features/farms/pages/sprayer-page.tsx'), 'SprayerPage');
const editSprayer = () => import('../features/farms/pages/edit-sprayer-pages.tsx');
const NewSprayerPage = page(editSprayer, 'NewSprayerPage');
const EditSprayerPage = page(editSprayer, 'EditSprayerPage');
const NoticesPage = page(() => import('../features/notices/pages/notices-page.tsx'), 'NoticesPage');
const DevicesPage = page(() => import('../features/notices/pages/devices-page.tsx'), 'DevicesPage');
const HooksPage = page(() => import('../features/notices/pages/hooks-page.tsx'), 'HooksPage');
const PeoplePage = page(() => import('../features/people/pages/people-page.tsx'), 'PeoplePage');
const AuditPage = page(() => import('../features/people/pages/audit-page.tsx'), 'AuditPage');
const ClockPage = page(() => import('../features/demo/pages/clock-page.tsx'), 'ClockPage');
const PhonePage = page(() => import('../features/demo/pages/phone-page.tsx'), 'PhonePage');
const MailboxPage = page(() => import('../features/demo/pages/mailbox-page.tsx'), 'MailboxPage');
const HookLogPage = page(() => import('../features/demo/pages/hook-log-page.tsx'), 'HookLogPage');

/** Every page of the client. Daybreak comes with the first load, the others when they are opened. */
export function Router() {
  return (
    <BrowserRouter>
      <Routes>
        <Route element={<PlainLayout />}>
          <Route path="sign-in" element={<SignInPage />} />
          <Route path="sign-up" element={<SignUpPage />} />
          <Route path="confirm" element={<ConfirmPage />} />
          <Route path="forgot" element={<ForgotPage />} />
          <Route path="reset" element={<ResetPage />} />
          <Route path="invitation" element={<InvitationPage />} />
          <Route path="demo/clock" element={<ClockPage />} />
          <Route path="demo/phone" element={<PhonePage />} />
          <Route path="demo/mailbox" element={<MailboxPage />} />
          <Route path="demo/hooks" element={<HookLogPage />} />
          <Route path="*" element={<NotFoundPage />} />
        </Route>
        <Route element={<SignedIn />}>
          <Route index element={<Home />} />
          <Route element={<PlainLayout />}>
            <Route path="account" element={<AccountPage />} />
            <Route path="farms/new" element={<FirstRunPage />} />
          </Route>
          <Route path="farms/:farmId" element={<FarmGate />}>
            <Route element={<FarmLayout />}>
              <Route index element={<DaybreakPage />} />
              <Route path="mornings/:date" element={<MorningPage />} />
              <Route path="plans">
                <Route index element={<PlansPage />} />
                <Route path="new" element={<NewPlanPage />} />
                <Route path=":id" element={<PlanPage />} />
                <Route path=":id/edit" element={<EditPlanPage />} />
              </Route>
              <Route path="shelf">
                <Route index element={<ShelfPage />} />
                <Route path="new" element={<NewProductPage />} />
                <Route path=":id" element={<ProductPage />} />
                <Route path=":id/edit" element={<EditProductPage />} />
              </Route>
              <Route path="settings">
                <Route index element={<FarmPage />} />
                <Route path="edit" element={<EditFarmPage />} />
                <Route path="blocks/new" element={<NewBlockPage />} />
                <Route path="blocks/:id" element={<BlockPage />} />
                <Route path="blocks/:id/edit" element={<EditBlockPage />} />
                <Route path="places/new" element={<NewPlacePage />} />
                <Route path="places/:id" element={<PlacePage />} />
                <Route path="places/:id/edit" element={<EditPlacePage />} />
                <Route path="sprayers/new" element={<NewSprayerPage />} />
                <Route path="sprayers/:id" element={<SprayerPage />} />
                <Route path="sprayers/:id/edit" element={<EditSprayerPage />} />
              </Route>
              <Route path="notices">
                <Route index element={<NoticesPage />} />
                <Route path="devices" element={<DevicesPage />} />
                <Route path="hooks" element={<HooksPage />} />
              </Route>
              <Route path="people">
                <Route index element={<PeoplePage />} />
                <Route path="changes" element={<AuditPage />} />
              </Route>
              <Route path="*" element={<NotFoundPage />} />
            </Route>
          </Route>
        </Route>
      </Routes>
    </BrowserRouter>
  );
}
