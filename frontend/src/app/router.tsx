import type { ReactNode } from 'react';
import { createBrowserRouter, RouterProvider } from 'react-router-dom';
import { routes } from './routes';

/** Made once: a first page that has to wait for its words may be started more than once. */
const router = createBrowserRouter(routes);

/** The pages by their addresses. */
export function App(): ReactNode {
  return <RouterProvider router={router} />;
}
