import { StrictMode, type ComponentType } from 'react';
import { createRoot } from 'react-dom/client';
import { BrowserRouter, useSearchParams } from 'react-router-dom';
import '../../../src/app/styles.css';
import { ToastProvider } from '../../../src/components/index.ts';
import { applyTheme } from '../../../src/lib/theme.ts';
import { FormsPart } from './forms-part.tsx';
import { FramePart } from './frame-part.tsx';
import { KitPart } from './kit-part.tsx';
import { RibbonPart } from './ribbon-part.tsx';
import { SignPart } from './sign-part.tsx';
import { TablePart } from './table-part.tsx';

/** What the gallery shows, by the `part` of its address. */
const parts: Record<string, ComponentType> = { signs: SignPart, ribbon: RibbonPart, kit: KitPart, forms: FormsPart, table: TablePart };

function Gallery() {
  const [search] = useSearchParams();
  const Part = parts[search.get('part') ?? ''];
  if (search.get('part') === 'frame') return <FramePart />;
  return <main className="mx-auto max-w-6xl px-4 py-6">{Part ? <Part /> : <p>There is no such part.</p>}</main>;
}

applyTheme();
createRoot(document.getElementById('root')!).render(
  <StrictMode>
    <BrowserRouter>
      <ToastProvider>
        <Gallery />
      </ToastProvider>
    </BrowserRouter>
  </StrictMode>,
);
