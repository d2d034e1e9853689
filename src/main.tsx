import { StrictMode } from 'react';
import { createRoot } from 'react-dom/client';
import { RouterProvider } from 'react-router-dom';
import { Providers } from './app/providers';
import { createAppRouter } from './app/router';
import { createServices } from './app/services';
import './styles/index.css';

const root = document.getElementById('root');
if (root === null) throw new Error('The page has no place for the application.');

const services = createServices();

createRoot(root).render(
  <StrictMode>
    <Providers services={services}>
      <RouterProvider router={createAppRouter(services.queryClient)} />
    </Providers>
  </StrictMode>,
);
