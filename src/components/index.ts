/**
 * The kit that pages are built of. Every target is at least 48 px; state is never told by colour alone.
 */
export { AppFrame, type FrameLink } from './app-frame.tsx';
export { Button, ButtonLink } from './button.tsx';
export { Dialog } from './dialog.tsx';
export { LastWord, PageHeading, Panel } from './page.tsx';
export { MiniRibbon } from './ribbon/mini-ribbon.tsx';
export { EmptyState, Mark, PanelErrorBoundary, Skeleton } from './states.tsx';
export { ThemeToggle } from './theme-toggle.tsx';
export { ToastProvider, useToast } from './toast.tsx';
export { VerdictSign } from './verdict-sign.tsx';
