import { lazy } from 'react';
import { BrowserRouter, Route, Routes } from 'react-router';
import Home from './routes/home.tsx';
import { Shell } from './shell.tsx';

// The first page comes with the first chunk; every other screen is fetched when it is opened.
const Fit = lazy(() => import('./routes/fit.tsx'));
const Hull = lazy(() => import('./routes/hull.tsx'));
const LowerUnit = lazy(() => import('./routes/lower-unit.tsx'));
const Transducer = lazy(() => import('./routes/transducer.tsx'));
const Mount = lazy(() => import('./routes/mount.tsx'));
const SignIn = lazy(() => import('./routes/sign-in.tsx'));
const SignUp = lazy(() => import('./routes/sign-up.tsx'));
const Verify = lazy(() => import('./routes/verify.tsx'));
const Reset = lazy(() => import('./routes/reset.tsx'));
const Outbox = lazy(() => import('./routes/outbox.tsx'));
const Invitation = lazy(() => import('./routes/invitation.tsx'));
const Account = lazy(() => import('./routes/account.tsx'));
const Admin = lazy(() => import('./routes/admin.tsx'));
const AdminPerson = lazy(() => import('./routes/admin-person.tsx'));
const AdminInvitations = lazy(() => import('./routes/admin-invitations.tsx'));
const AdminLimits = lazy(() => import('./routes/admin-limits.tsx'));
const AdminAudit = lazy(() => import('./routes/admin-audit.tsx'));
const AdminMail = lazy(() => import('./routes/admin-mail.tsx'));
const AdminMailSheet = lazy(() => import('./routes/admin-mail-sheet.tsx'));
const AdminHealth = lazy(() => import('./routes/admin-health.tsx'));
const Steward = lazy(() => import('./routes/steward.tsx'));
const StewardEditions = lazy(() => import('./routes/steward-editions.tsx'));
const StewardImport = lazy(() => import('./routes/steward-import.tsx'));
const NotFound = lazy(() => import('./routes/not-found.tsx'));

export function Router() {
  return (
    <BrowserRouter>
      <Routes>
        <Route element={<Shell />}>
          <Route index element={<Home />} />
          <Route path="fit" element={<Fit />} />
          <Route path="hulls/:id" element={<Hull />} />
          <Route path="lower-units/:id" element={<LowerUnit />} />
          <Route path="transducers/:id" element={<Transducer />} />
          <Route path="mounts/:id" element={<Mount />} />
          <Route path="sign-in" element={<SignIn />} />
          <Route path="sign-up" element={<SignUp />} />
          <Route path="verify" element={<Verify />} />
          <Route path="reset" element={<Reset />} />
          <Route path="outbox" element={<Outbox />} />
          <Route path="invitation" element={<Invitation />} />
          <Route path="account" element={<Account />} />
          <Route path="admin" element={<Admin />} />
          <Route path="admin/people/:id" element={<AdminPerson />} />
          <Route path="admin/invitations" element={<AdminInvitations />} />
          <Route path="admin/limits" element={<AdminLimits />} />
          <Route path="admin/audit" element={<AdminAudit />} />
          <Route path="admin/mail" element={<AdminMail />} />
          <Route path="admin/mail/:id" element={<AdminMailSheet />} />
          <Route path="admin/health" element={<AdminHealth />} />
          <Route path="steward" element={<Steward />} />
          <Route path="steward/editions" element={<StewardEditions />} />
          <Route path="steward/imports/:id" element={<StewardImport />} />
          <Route path="*" element={<NotFound />} />
        </Route>
      </Routes>
    </BrowserRouter>
  );
}
