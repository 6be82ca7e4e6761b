import type { Waveform } from "../circuit/analysis";

type Pulse = Extract<Waveform, { shape: "pulse" }>;
type Points = Extract<Waveform, { shape: "points" }>;

/** A waveform at a time, s; at a jump the value after it counts. */
export function waveformValue(waveform: Waveform, time: number): number {
  switch (waveform.shape) {
    case "pulse":
      return pulse(waveform, time);
    case "sine":
      return sine(waveform, time);
    case "points":
      return between(waveform, time);
    case "step":
      return time < waveform.at ? waveform.from : waveform.to;
  }
}

/** The times in (0, until) where the waveform or its slope jumps, ascending. */
export function waveformCorners(waveform: Waveform, until: number): readonly number[] {
  const all = cornersOf(waveform, until).filter((time) => time > 0 && time < until);
  return [...new Set(all)].sort((one, other) => one - other);
}

function cornersOf(waveform: Waveform, until: number): readonly number[] {
  switch (waveform.shape) {
    case "sine":
      return [waveform.delay];
    case "step":
      return [waveform.at];
    case "points":
      return waveform.points.map(([time]) => time);
    case "pulse":
      return pulseCorners(waveform, until);
  }
}

function pulseCorners(pulse: Pulse, until: number): readonly number[] {
  const { delay, rise, width, fall, period } = pulse;
  const once = [0, rise, rise + width, rise + width + fall];
  const count = period === null ? 1 : Math.max(0, Math.ceil((until - delay) / period));
  const corners: number[] = [];
  for (let k = 0; k < count; k++)
    for (const corner of once) corners.push(delay + k * (period ?? 0) + corner);
  return corners;
}

function pulse({ low, high, delay, rise, fall, width, period }: Pulse, time: number): number {
  if (time < delay) return low;
  const since = time - delay;
  // The corners are computed as delay + k period + ...: the same sum here, so that a jump falls on its corner.
  const start = period === null ? delay : delay + Math.floor(since / period) * period;
  const next = period === null ? start : start + period;
  const base = period !== null && time >= next ? next : start;
  if (time < base + rise) return low + ((high - low) * (time - base)) / rise;
  if (time < base + (rise + width)) return high;
  if (time < base + (rise + width + fall))
    return high + ((low - high) * (time - (base + (rise + width)))) / fall;
  return low;
}

function sine(waveform: Extract<Waveform, { shape: "sine" }>, time: number): number {
  const { offset, amplitude, frequency, delay, phase } = waveform;
  const angle = 2 * Math.PI * frequency * Math.max(0, time - delay) + (phase * Math.PI) / 180;
  return offset + amplitude * Math.sin(angle);
}

function between({ points }: Points, time: number): number {
  let low = 0;
  let high = points.length - 1;
  const [firstTime, first] = points[0] ?? [0, 0];
  const [lastTime, last] = points[high] ?? [0, 0];
  if (time <= firstTime) return first;
  if (time >= lastTime) return last;
  while (high - low > 1) {
    const middle = (low + high) >> 1;
    if ((points[middle]?.[0] ?? 0) <= time) low = middle;
    else high = middle;
  }
  const [t0, v0] = points[low] ?? [0, 0];
  const [t1, v1] = points[high] ?? [1, 0];
  return v0 + ((v1 - v0) * (time - t0)) / (t1 - t0);
}
