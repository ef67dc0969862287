import { lazy } from 'react';
import { BrowserRouter, Route, Routes } from 'react-router';
import { Shell } from './shell.tsx';

// The first page comes with the first chunk; every other screen is fetched when it is opened.
const NotFound = lazy(() => import('./routes/not-found.tsx'));

export function Router() {
  return (
    <BrowserRouter>
      <Routes>
        <Route element={<Shell />}>
          <Route path="*" element={<NotFound />} />
        </Route>
      </Routes>
    </BrowserRouter>
  );
}
