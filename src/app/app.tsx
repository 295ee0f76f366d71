import { QueryClientProvider } from '@tanstack/react-query';
import { RouterProvider } from 'react-router-dom';
import { HintProvider } from '../components/hint';
import { queryClient } from './client';
import { router } from './router';

export const App = () => (
  <QueryClientProvider client={queryClient}>
    <HintProvider>
      <RouterProvider router={router} />
    </HintProvider>
  </QueryClientProvider>
);
