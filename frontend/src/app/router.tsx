import { useState, type ReactNode } from 'react';
import { createBrowserRouter, RouterProvider } from 'react-router-dom';
import { routes } from './routes';

/** The pages by their addresses. */
export function App(): ReactNode {
  const [router] = useState(() => createBrowserRouter(routes));
  return <RouterProvider router={router} />;
}
