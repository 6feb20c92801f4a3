import { createBrowserRouter } from 'react-router-dom';
import { loadPatiently } from '#src/components/later.ts';
import { RouteError } from './route-error.tsx';
import { BenchRoute } from './routes/bench.tsx';
import { NotFound } from './routes/not-found.tsx';
import { Shell } from './shell.tsx';

/** The page carries its base, so that the product also works under a path. */
const basename = new URL('.', document.baseURI).pathname;

export const router = createBrowserRouter(
  [
    {
      element: <Shell />,
      errorElement: <RouteError />,
      hydrateFallbackElement: <p className="loading-words">Opening…</p>,
      children: [
        { path: '/', element: <BenchRoute /> },
        { path: '/draw', lazy: async () => ({ Component: (await loadPatiently(() => import('./routes/draw.tsx'))).DrawRoute }) },
        { path: '/start', lazy: async () => ({ Component: (await loadPatiently(() => import('./routes/start.tsx'))).StartRoute }) },
        { path: '*', element: <NotFound /> },
      ],
    },
  ],
  { basename },
);
