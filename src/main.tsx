import { StrictMode } from 'react';
import { createRoot } from 'react-dom/client';
import { Providers } from './app/providers.tsx';
import { Router } from './app/router.tsx';
import { applyTheme } from './lib/theme.ts';
import './app/styles.css';

applyTheme();
createRoot(document.getElementById('root')!).render(
  <StrictMode>
    <Providers>
      <Router />
    </Providers>
  </StrictMode>,
);
