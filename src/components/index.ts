/**
 * The kit that pages are built of. Every target is at least 48 px; state is never told by colour alone; words of the kit
 * itself are in `lib/messages/en.ts` and said by `useT()`.
 *
 * Frame
 * - `AppFrame` { links: { to, name, icon?, end? }[], place?, strip?, children }: bar under the thumb on a phone (four links, the
 *   others under More), list at the side on a wide screen; ends every page with `LastWord`.
 * - `PageHeading` { title, over?, up?: [address, name], low?, children }: names the tab and takes the focus on arrival.
 * - `Panel` { title, actions?, children }: a part of a page under a line. `LastWord`: whose word is final.
 * - `Dialog` { open, onClose, title, children }: the browser's own.
 *
 * Signs
 * - `VerdictSign` { state: 'go' | 'hold' | 'unknown', size, silent? }: the disc and the horizon, 24 to 600 px. The same as SVG
 *   text for letters and notifications: `verdictSignSvg` in `shared/look/verdict-sign.ts`.
 * - `HeadroomRibbon` { answer, timeZone, minutesNeeded, units }: a morning, limit by limit, with its time cursor. Imported from
 *   `ribbon/headroom-ribbon.tsx`, because Daybreak loads without it.
 * - `MiniRibbon` { headroom, sunAltitudeDeg, className }: a morning in a list; `className` gives its height and width.
 * - `Icon` { name, size? }: the few line drawings.
 *
 * Acts
 * - `Button` { variant?: 'primary' | 'quiet' | 'link', busy?, … }, `ButtonLink` { to, variant? }, `IconButton` { icon, label }.
 * - `SegmentedControl` { legend, legendHidden?, value, onChange, options: [value, words][] }: one of a few.
 * - `ThemeToggle` { place?: { latitude, longitude } }: light, dark, by the sun, as the device.
 * - `ToastProvider`, `useToast()` → say(text, { undo? }): a short word, and undo instead of "are you sure".
 *
 * What is shown
 * - `DataTable` { label, rows, columns: { key, head, value, cell?, figures?, wrap? }[], rowKey, to?, csvName?, nothing, name? }: sorts,
 *   searches, saves as CSV, keeps its arrangement in the address. Imported from `data-table/data-table.tsx`.
 * - `Mark` { strong? }: a few words set apart. `EmptyState`: says what to do. `Skeleton` { lines? }.
 * - `PanelErrorBoundary` { onRetry }: keeps a failure to its part; `records/query-panel.tsx` joins it with Suspense.
 * - `LocalTime` { instant, reader, as?: 'clock' | 'date' }, `Quantity` { value, of, units? }: in the person's own way.
 *
 * Things that a farm keeps have ready pages in `records/`. Forms are in `lib/forms`: `useTypedForm` over a shared schema gives
 * each field by `bind(name)`; `TextField` (also date and time, by `type`), `NumberField`, `ChoiceField`, `CheckField`,
 * `CheckGroup`, `NotesField` show the problem beside the field; `FileField` { label, accept, hint?, problem?, busy?, onFile };
 * `RecordForm` sends, lists several problems above and moves the focus there; problems of the server find their fields.
 */
export { AppFrame, type FrameLink } from './app-frame.tsx';
export { Button, ButtonLink, IconButton } from './button.tsx';
export { Dialog } from './dialog.tsx';
export { Icon, type IconName } from './icon.tsx';
export { LastWord, PageHeading, Panel } from './page.tsx';
export { MiniRibbon } from './ribbon/mini-ribbon.tsx';
export { SegmentedControl } from './segmented-control.tsx';
export { EmptyState, Mark, PanelErrorBoundary, Skeleton } from './states.tsx';
export { ThemeToggle } from './theme-toggle.tsx';
export { ToastProvider, useToast } from './toast.tsx';
export { LocalTime, Quantity } from './values.tsx';
export { VerdictSign } from './verdict-sign.tsx';
