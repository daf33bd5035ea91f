/** Where everything of a ribbon stands, in drawing units. Time runs right on a wide screen and down on a phone. */
export interface Layout {
  upright: boolean;
  viewBox: string;
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
  cursor(index: number): string;
  cursorPath: string;
  cursorGrip: { cx: number; cy: number };
  indexAt(shareX: number, shareY: number): number;
}

const wide = { width: 660, gutter: 112, end: 14, axis: 24, sky: 26, lane: 40, job: 36 };
const tall = { width: 360, gutter: 46, end: 8, head: 118, sky: 22, step: 7.4, foot: 12 };

export function layoutOf({ steps, lanes, upright }: { steps: number; lanes: number; upright: boolean }): Layout {
  const last = Math.max(1, steps - 1);
  const clamp = (index: number): number => Math.max(0, Math.min(last, Math.round(index)));
  if (!upright) {
    const timeFrom = wide.gutter;
    const timeTo = wide.width - wide.end;
    const skyFrom = wide.axis;
    const lanesFrom = wide.axis + wide.sky + 8;
    const lanesTo = lanesFrom + lanes * wide.lane;
    const height = lanesTo + wide.job;
    const at = (index: number): number => timeFrom + (index / last) * (timeTo - timeFrom);
    const across = (index: number): number => lanesFrom + (index + 0.5) * wide.lane;
    return {
      upright, width: wide.width, height, viewBox: `0 0 ${wide.width} ${height}`, at, halfMost: wide.lane / 2 - 5, across, lane: (index) => `translate(0 ${across(index)})`,
      timeFrom, timeTo, lanesFrom, lanesTo, skyFrom, skyThickness: wide.sky,
      cursor: (index) => `translate(${at(index).toFixed(1)} 0)`, cursorPath: `M0 ${skyFrom}V${lanesTo + 6}`, cursorGrip: { cx: 0, cy: lanesTo + 10 },
      indexAt: (shareX) => clamp(((shareX * wide.width - timeFrom) / (timeTo - timeFrom)) * last),
    };
  }
  const timeFrom = tall.head;
  const timeTo = timeFrom + last * tall.step;
  const height = timeTo + tall.foot;
  const skyFrom = tall.gutter;
  const lanesFrom = tall.gutter + tall.sky + 6;
  const lanesTo = tall.width - tall.end - 16;
  const room = (lanesTo - lanesFrom) / Math.max(1, lanes);
  const at = (index: number): number => timeFrom + (index / last) * (timeTo - timeFrom);
  const across = (index: number): number => lanesFrom + (index + 0.5) * room;
  return {
    upright, width: tall.width, height, viewBox: `0 0 ${tall.width} ${height}`, at, halfMost: Math.min(24, room / 2 - 2.5), across,
    // Along x becomes down: the drawing is mirrored about the diagonal.
    lane: (index) => `matrix(0 1 1 0 ${across(index)} 0)`,
    timeFrom, timeTo, lanesFrom, lanesTo, skyFrom, skyThickness: tall.sky,
    cursor: (index) => `translate(0 ${at(index).toFixed(1)})`, cursorPath: `M${skyFrom} 0H${lanesTo + 4}`, cursorGrip: { cx: lanesTo + 10, cy: 0 },
    indexAt: (_shareX, shareY) => clamp(((shareY * height - timeFrom) / (timeTo - timeFrom)) * last),
  };
}
