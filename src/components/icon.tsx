/** Line drawings on a 24-unit square. They stand beside words, or in an `IconButton` that names itself. */
const drawings = {
  daybreak: 'M2 18h20M6 18a6 6 0 0 1 12 0M12 4v4M4.2 9.2l2 2M19.8 9.2l-2 2',
  plan: 'M6 3h9l4 4v14H6zM15 3v4h4M9 12h7M9 16h5',
  shelf: 'M10 3h4v4l3 3v11H7V10l3-3zM7 14h10',
  farm: 'M12 3c4 0 7 3 7 6.5S16 15 12 15s-7-2-7-5.5S8 3 12 3zM12 9v12M8 21h8',
  bell: 'M6 17V11a6 6 0 0 1 12 0v6l2 1.5H4zM10 21h4',
  people: 'M9 11a3.5 3.5 0 1 0 0-7 3.5 3.5 0 0 0 0 7zM2.5 20c0-3.5 3-6 6.5-6s6.5 2.5 6.5 6M16 4.5a3.2 3.2 0 0 1 0 6M18 14.5c2.2.8 3.5 2.8 3.5 5.5',
  person: 'M12 11.5a4 4 0 1 0 0-8 4 4 0 0 0 0 8zM4 21c0-4 3.5-6.5 8-6.5s8 2.5 8 6.5',
  more: 'M5 7h14M5 12h14M5 17h14',
  close: 'M5 5l14 14M19 5L5 19',
  back: 'M20 12H4M10 5l-7 7 7 7',
  find: 'M10.5 17a6.5 6.5 0 1 0 0-13 6.5 6.5 0 0 0 0 13zM15.5 15.5L21 21',
  save: 'M12 3v12M7 10.5l5 5 5-5M4 20h16',
  up: 'M12 20V5M5.5 11L12 4.5 18.5 11',
  down: 'M12 4v15M5.5 13l6.5 6.5 6.5-6.5',
} as const;

export type IconName = keyof typeof drawings;

/** @param size side in pixels */
export const Icon = ({ name, size = 22 }: { name: IconName; size?: number }) => (
  <svg width={size} height={size} viewBox="0 0 24 24" className="shrink-0 fill-none stroke-current" strokeWidth={1.75} strokeLinecap="round" strokeLinejoin="round" aria-hidden="true">
    <path d={drawings[name]} />
  </svg>
);
