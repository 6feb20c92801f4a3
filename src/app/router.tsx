import { createBrowserRouter } from 'react-router-dom';
import { BenchRoute } from './routes/bench.tsx';
import { NotFound } from './routes/not-found.tsx';

/** The page carries its base, so that the product also works under a path. */
const basename = new URL('.', document.baseURI).pathname;

export const router = createBrowserRouter(
  [
    { path: '/', element: <BenchRoute /> },
    { path: '*', element: <NotFound /> },
  ],
  { basename },
);
