import type { Place } from "../circuit/place";
import { positive } from "../values/range";
import type { ParameterValue } from "./parameter";

interface DatasheetPoint {
  readonly current: number;
  readonly voltage: number;
}

const ROUNDS = 8;

/** k T / q at 25 °C, V, with the exact k and q of the SI (2019). */
const THERMAL_VOLTAGE = (1.380649e-23 * 298.15) / 1.602176634e-19;

/**
 * The junction numbers that pass through datasheet points at 25 °C: from two points, saturation current and
 * emission coefficient; from more, also the series resistance, by least squares in the voltage
 * v = n Vt ln((i + Is) / Is) + Rs i. With Is in the sum taken from the round before, this is linear in n,
 * n ln Is and Rs; as Is is far below the currents, a few rounds settle it.
 */
export function readFit(place: Place): ReadonlyMap<string, ParameterValue> | null {
  const items = place.items();
  if (items === null) return null;
  const points = items.flatMap((item) => readPoint(item) ?? []);
  if (points.length < items.length) return null;
  const currents = new Set(points.map((point) => point.current));
  if (currents.size < 2 || currents.size < points.length) {
    return place.fault("badValue", "A fit needs two points or more, each at another current.");
  }
  let saturationCurrent = 0;
  let line = fitLine(points, saturationCurrent);
  for (let round = 0; round < ROUNDS; round += 1) {
    saturationCurrent = Math.exp(-line.offset / line.slope);
    line = fitLine(points, saturationCurrent);
  }
  const { slope, resistance } = line;
  if (!(slope > 0 && saturationCurrent > 0 && Number.isFinite(saturationCurrent))) {
    return place.fault("badValue", "No junction passes through these points; check them.");
  }
  return new Map([
    ["saturationCurrent", saturationCurrent],
    ["emissionCoefficient", slope / THERMAL_VOLTAGE],
    ["seriesResistance", resistance],
  ]);
}

function readPoint(place: Place): DatasheetPoint | null {
  const fields = place.fields(["current", "voltage"]);
  if (fields === null) return null;
  const current = fields.required("current")?.quantity("current", positive) ?? null;
  const voltage = fields.required("voltage")?.quantity("voltage", positive) ?? null;
  return current === null || voltage === null ? null : { current, voltage };
}

interface Line {
  /** n Vt, V */
  readonly slope: number;
  /** -n Vt ln Is, V */
  readonly offset: number;
  readonly resistance: number;
}

/** The line through the points; without a series resistance where a negative one would fit best. */
function fitLine(points: readonly DatasheetPoint[], saturationCurrent: number): Line {
  const logs = points.map((point) => Math.log(point.current + saturationCurrent));
  const withResistance = points.length > 2 ? fitThree(points, logs) : null;
  return withResistance !== null && withResistance.resistance >= 0
    ? withResistance
    : fitTwo(points, logs);
}

/** v = slope log + offset, by least squares. */
function fitTwo(points: readonly DatasheetPoint[], logs: readonly number[]): Line {
  const voltages = points.map((point) => point.voltage);
  const slope = covariance(logs, voltages) / covariance(logs, logs);
  return { slope, offset: mean(voltages) - slope * mean(logs), resistance: 0 };
}

/** v = slope log + resistance i + offset, by least squares. */
function fitThree(points: readonly DatasheetPoint[], logs: readonly number[]): Line {
  const currents = points.map((point) => point.current);
  const voltages = points.map((point) => point.voltage);
  const a = covariance(logs, logs);
  const b = covariance(logs, currents);
  const c = covariance(currents, currents);
  const determinant = a * c - b * b;
  const p = covariance(logs, voltages);
  const q = covariance(currents, voltages);
  const slope = (p * c - q * b) / determinant;
  const resistance = (q * a - p * b) / determinant;
  const offset = mean(voltages) - slope * mean(logs) - resistance * mean(currents);
  return { slope, offset, resistance };
}

function mean(values: readonly number[]): number {
  return values.reduce((sum, value) => sum + value, 0) / values.length;
}

function covariance(left: readonly number[], right: readonly number[]): number {
  const [leftMean, rightMean] = [mean(left), mean(right)];
  return mean(left.map((value, index) => (value - leftMean) * ((right[index] ?? 0) - rightMean)));
}
