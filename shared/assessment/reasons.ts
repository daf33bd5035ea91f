import { cautionsOf } from './cautions.ts';
import { atLimit, closingAt, failingOf, isoAt } from './failing.ts';
import { reason, type BareReason, type Failing } from './messages.ts';
import { stepMinutes } from './morning.ts';
import { highestStep, longestRun, lowestStep, shutTrack, type Judgement } from './verdict.ts';
import { minutesOf } from './windows.ts';

/** Why the verdict is what it is, the leading reason first; not yet in words. */
export function reasonsOf(judgement: Judgement): BareReason[] {
  const { chosen, enoughToTell } = judgement;
  if (chosen) return [...goReasons(judgement), ...cautionsOf(judgement)];
  if (!enoughToTell) return [...missingReasons(judgement), ...holdReasons(judgement), ...cautionsOf(judgement)];
  return [...missReasons(judgement), ...holdReasons(judgement), ...cautionsOf(judgement)];
}

function goReasons(judgement: Judgement): BareReason[] {
  const { chosen, least, leastTrack, tracks, neededMinutes } = judgement;
  if (!chosen) return [];
  const from = Math.round(chosen.bestStartMin / stepMinutes);
  const tightest = lowestStep(least, from, Math.min(chosen.to, from + Math.max(1, Math.ceil(neededMinutes / stepMinutes))));
  const track = tracks[leastTrack[tightest] ?? -1];
  const closes = closingAt(judgement, chosen.to, 'closes');
  const reasons: BareReason[] = [];
  if (track) reasons.push(reason(track.limit, 'binding', 'limit.binding', atLimit(judgement, track, tightest), isoAt(judgement, tightest)));
  reasons.push(reason(closes?.limit ?? 'time', 'advice', 'window.closes', { endAt: isoAt(judgement, chosen.to), failing: closes }, isoAt(judgement, chosen.to)));
  return reasons;
}

/** One reason per hard limit that fails anywhere, the binding one first. */
function holdReasons(judgement: Judgement): BareReason[] {
  const failings = judgement.tracks.flatMap((track) => {
    const failing = track.isHard ? failingOf(judgement, track) : null;
    return failing ? [failing] : [];
  });
  failings.sort((a, b) => Number(b.limit === judgement.bindingLimit) - Number(a.limit === judgement.bindingLimit));
  return failings.map((failing) => reason(failing.limit, 'hold', 'limit.fails', failing, failing.pattern === 'until' ? failing.untilAt : failing.fromAt));
}

/** What the job lacked: minutes of the longest window, or the nearest any step came. */
function missReasons(judgement: Judgement): BareReason[] {
  const { runs, neededMinutes, morning, bindingLimit } = judgement;
  const { count } = morning.morning;
  if (count === 0) return [reason('time', 'hold', 'time.noMorning', {})];
  const longest = longestRun(runs);
  if (longest) {
    const closes = closingAt(judgement, longest.to, 'closes');
    const opens = closingAt(judgement, longest.from - 1, 'opens');
    if (!opens && !closes) return [reason('time', 'nearestMiss', 'time.morningShort', { morningMinutes: minutesOf(longest), neededMinutes })];
    const missingMinutes = Math.ceil(neededMinutes - minutesOf(longest));
    return [reason((closes ?? opens)?.limit ?? 'time', 'nearestMiss', 'miss.short', { missingMinutes, opens, closes }, closes?.fromAt ?? opens?.untilAt ?? null)];
  }
  if (count * stepMinutes < neededMinutes) return [reason('time', 'hold', 'time.morningShort', { morningMinutes: count * stepMinutes, neededMinutes })];
  const shut = shutTrack(judgement.tracks);
  const overlap = shut ? null : overlapOf(judgement);
  if (overlap) return [overlap];
  const step = highestStep(shut ? shut.headroom : judgement.least);
  const track = shut ?? judgement.tracks[judgement.leastTrack[step] ?? -1];
  if (!track || !(track.headroom[step]! > -1) || bindingLimit === 'data') return [];
  // A limit that fails all morning leads with its own sentence; how near it came is told after it.
  const failing = shut ? failingOf(judgement, shut) : null;
  const closest = reason(track.limit, 'nearestMiss', 'miss.closest', atLimit(judgement, track, step), isoAt(judgement, step));
  return failing ? [reason(track.limit, 'nearestMiss', 'limit.fails', failing), closest] : [closest];
}

/** Two limits that close the morning between them: the one that holds from its start, and the one that closes to its end. */
function overlapOf(judgement: Judgement): BareReason | null {
  const failings = judgement.tracks.flatMap((track): Failing[] => {
    const failing = track.isHard ? failingOf(judgement, track) : null;
    return failing ? [failing] : [];
  });
  if (failings.some((failing) => failing.pattern === 'all')) return null;
  const first = failings.filter((failing) => failing.pattern === 'until').sort((a, b) => (a.untilAt ?? '').localeCompare(b.untilAt ?? '')).at(-1);
  const last = failings.filter((failing) => failing.pattern === 'from').sort((a, b) => (a.fromAt ?? '').localeCompare(b.fromAt ?? ''))[0];
  if (!first?.untilAt || !last?.fromAt || first.untilAt < last.fromAt) return null;
  return reason(first.limit, 'nearestMiss', 'miss.noOverlap', { first, last }, last.fromAt);
}

/** Which values are missing for which limit, and when. */
function missingReasons(judgement: Judgement): BareReason[] {
  const { tracks, isUntold, morning } = judgement;
  if (!tracks.some((track) => track.isHard)) return [reason('data', 'notEnough', 'data.noLimits', {})];
  if (morning.hours.isEmpty) return [reason('data', 'notEnough', 'data.noForecast', {})];
  return tracks.flatMap((track) => {
    if (!track.isHard) return [];
    let first = -1;
    let last = -1;
    for (let step = 0; step < isUntold.length; step += 1) {
      if (isUntold[step] === 0 || !Number.isNaN(track.headroom[step]!)) continue;
      if (first < 0) first = step;
      last = step;
    }
    if (first < 0) return [];
    return [reason('data', 'notEnough', 'data.missing', { limit: track.limit, fromAt: isoAt(judgement, first), untilAt: isoAt(judgement, last + 1) }, isoAt(judgement, first))];
  });
}
