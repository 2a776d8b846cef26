import { useState } from 'react';
import { RouterProvider } from 'react-router-dom';
import { Providers } from './app/Providers.tsx';
import { createRouter } from './app/router.tsx';

export function App() {
  const [router] = useState(createRouter);
  return (
    <Providers>
      <RouterProvider router={router} />
    </Providers>
  );
}
