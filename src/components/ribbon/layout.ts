/** Where everything of a ribbon stands, in pixels. Time runs right on a wide screen and down on a phone. */
export interface Layout {
  upright: boolean;
  width: number;
  height: number;
  /** Distance along time of a step. */
  at(index: number): number;
  /** Half thickness of a ribbon at headroom 1. */
  halfMost: number;
  /** Turns a drawing along time (x) around 0 (y) into the lane. */
  lane(index: number): string;
  /** Middle of a lane across time. */
  across(index: number): number;
  /** Extent of time, and of the lanes across it. */
  timeFrom: number;
  timeTo: number;
  lanesFrom: number;
  lanesTo: number;
  skyFrom: number;
  skyThickness: number;
  /** Across time, beside the lanes: where the job is laid. */
  jobAt: number;
  /** Moves the time cursor, whose sun hangs in the middle of the sky. */
  cursor(index: number): string;
  cursorPath: string;
  cursorSun: { cx: number; cy: number };
  /** The part that drags without scrolling the page: at least a thumb wide. */
  rail: { x: number; y: number; width: number; height: number };
  /** The step nearest to a place in the drawing. */
  indexAt(x: number, y: number): number;
}

const wide = { gutter: 118, end: 18, axis: 22, sky: 30, gap: 8, lane: 38, job: 46 };
const tall = { gutter: 48, sky: 26, gap: 8, end: 26, head: 106, step: 6.4, foot: 30 };

interface LayoutOptions {
  steps: number;
  lanes: number;
  upright: boolean;
  widthPx: number;
}

/** Lays a ribbon out for the room it has. */
export const layoutOf = (options: LayoutOptions): Layout => (options.upright ? uprightLayout(options) : levelLayout(options));

const nearest = (share: number, last: number): number => Math.max(0, Math.min(last, Math.round(share * last)));

function levelLayout({ steps, lanes, widthPx: width }: LayoutOptions): Layout {
  const last = Math.max(1, steps - 1);
  const [timeFrom, timeTo] = [wide.gutter, width - wide.end];
  const skyFrom = wide.axis;
  const lanesFrom = skyFrom + wide.sky + wide.gap;
  const lanesTo = lanesFrom + lanes * wide.lane;
  const at = (index: number): number => timeFrom + (index / last) * (timeTo - timeFrom);
  const across = (index: number): number => lanesFrom + (index + 0.5) * wide.lane;
  return {
    upright: false,
    width,
    height: lanesTo + wide.job,
    at,
    halfMost: wide.lane / 2 - 6,
    across,
    lane: (index) => `translate(0 ${across(index)})`,
    timeFrom,
    timeTo,
    lanesFrom,
    lanesTo,
    skyFrom,
    skyThickness: wide.sky,
    jobAt: lanesTo + 8,
    cursor: (index) => `translate(${at(index).toFixed(1)} 0)`,
    cursorPath: `M0 ${skyFrom + wide.sky / 2}V${lanesTo + 20}`,
    cursorSun: { cx: 0, cy: skyFrom + wide.sky / 2 },
    rail: { x: timeFrom - 12, y: 0, width: timeTo - timeFrom + 24, height: lanesFrom },
    indexAt: (x) => nearest((x - timeFrom) / (timeTo - timeFrom), last),
  };
}

function uprightLayout({ steps, lanes, widthPx: width }: LayoutOptions): Layout {
  const last = Math.max(1, steps - 1);
  const [timeFrom, timeTo] = [tall.head, tall.head + last * tall.step];
  const skyFrom = tall.gutter;
  const lanesFrom = skyFrom + tall.sky + tall.gap;
  const lanesTo = width - tall.end;
  const room = (lanesTo - lanesFrom) / Math.max(1, lanes);
  const at = (index: number): number => timeFrom + (index / last) * (timeTo - timeFrom);
  const across = (index: number): number => lanesFrom + (index + 0.5) * room;
  return {
    upright: true,
    width,
    height: timeTo + tall.foot,
    at,
    halfMost: Math.min(24, room / 2 - 2.5),
    across,
    // Along x becomes down: the drawing is mirrored about the diagonal.
    lane: (index) => `matrix(0 1 1 0 ${across(index)} 0)`,
    timeFrom,
    timeTo,
    lanesFrom,
    lanesTo,
    skyFrom,
    skyThickness: tall.sky,
    jobAt: lanesTo + 6,
    cursor: (index) => `translate(0 ${at(index).toFixed(1)})`,
    cursorPath: `M${skyFrom + tall.sky / 2} 0H${width}`,
    cursorSun: { cx: skyFrom + tall.sky / 2, cy: 0 },
    rail: { x: 0, y: timeFrom - 24, width: lanesFrom, height: timeTo - timeFrom + 36 },
    indexAt: (_x, y) => nearest((y - timeFrom) / (timeTo - timeFrom), last),
  };
}
