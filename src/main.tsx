import { StrictMode } from 'react';
import { createRoot } from 'react-dom/client';
import { Providers } from './app/providers.tsx';
import { Router } from './app/router.tsx';
import { isApiProblem } from './lib/api/problem.ts';
import { applyTheme } from './lib/theme.ts';
import './app/styles.css';

applyTheme();
/** A refused call is told in the page; anything else that a boundary catches is a fault of ours and is reported. */
const onCaughtError = (error: unknown): void => {
  if (!isApiProblem(error)) reportError(error);
};

createRoot(document.getElementById('root')!, { onCaughtError }).render(
  <StrictMode>
    <Providers>
      <Router />
    </Providers>
  </StrictMode>,
);
