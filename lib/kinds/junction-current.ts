import type { Stage } from "./law";
import type { Junction } from "./part";

/** Boltzmann's constant over the elementary charge, V/K, both exact in the SI of 2019. */
const VOLTS_PER_KELVIN = 1.380649e-23 / 1.602176634e-19;
/** K that model numbers are stated at. */
const STATED_AT = 298.15;
/** Beyond this exponent the exponential goes on as its tangent; no solution rests there. */
const LARGEST_EXPONENT = 150;

/** k T / q, V, at degrees Celsius. */
export function thermalVoltage(celsius: number): number {
  return VOLTS_PER_KELVIN * (celsius + 273.15);
}

/** Is(T) = Is (T/Tn)^(Xti/n) exp((Eg/(n Vt)) (T/Tn - 1)). */
export function saturationCurrentAt(
  celsius: number,
  saturationCurrent: number,
  emissionCoefficient: number,
  bandgap: number,
  exponent: number,
): number {
  const ratio = (celsius + 273.15) / STATED_AT;
  const vt = emissionCoefficient * thermalVoltage(celsius);
  return (
    saturationCurrent *
    ratio ** (exponent / emissionCoefficient) *
    Math.exp((bandgap / vt) * (ratio - 1))
  );
}

/**
 * A junction's current, i = Is (exp(v/(n Vt)) - 1) - Ibv exp(-(v + Bv)/Vt), followed by Newton's steps
 * only as far as its exponentials can be trusted: beyond, it goes on as the tangent.
 */
export class JunctionCurrent {
  /** A, at the voltage last followed. */
  current = 0;
  /** S */
  conductance = 0;
  private last = 0;
  private readonly critical: number;
  private readonly breakdownCritical: number;

  constructor(
    private readonly saturationCurrent: number,
    /** n Vt, V */
    private readonly scale: number,
    private readonly breakdown: { voltage: number; current: number; scale: number } | null,
    /** Whether the search begins with this junction conducting. */
    private readonly beginsConducting: boolean,
  ) {
    this.critical = scale * Math.log(scale / (Math.SQRT2 * saturationCurrent));
    this.breakdownCritical =
      breakdown === null
        ? 0
        : Math.max(
            0,
            breakdown.scale * Math.log(breakdown.scale / (Math.SQRT2 * breakdown.current)),
          );
  }

  follow(v: number, at: Stage): void {
    const limited = this.followed(v, at.begin);
    if (Math.abs(limited - v) > 1e-9 * (1 + Math.abs(v))) at.limited++;
    this.last = limited;
    const e = exponential(limited / this.scale);
    this.conductance = (this.saturationCurrent * e.slope) / this.scale;
    this.current = this.saturationCurrent * (e.value - 1);
    const { breakdown } = this;
    if (breakdown !== null) {
      const b = exponential(-(limited + breakdown.voltage) / breakdown.scale);
      this.current -= breakdown.current * b.value;
      this.conductance += (breakdown.current * b.slope) / breakdown.scale;
    }
    this.current += this.conductance * (v - limited) + at.helping * v;
    this.conductance += at.helping;
  }

  private followed(v: number, begin: Stage["begin"]): number {
    if (begin === "warm") return v;
    if (begin === "cold") return this.beginsConducting ? this.critical : 0;
    return this.limit(v);
  }

  private limit(v: number): number {
    const { breakdown } = this;
    if (breakdown !== null && v < Math.min(0, -breakdown.voltage + 10 * breakdown.scale)) {
      const mirrored = nextJunctionVoltage(
        -(v + breakdown.voltage),
        -(this.last + breakdown.voltage),
        breakdown.scale,
        this.breakdownCritical,
      );
      return -(mirrored + breakdown.voltage);
    }
    return nextJunctionVoltage(v, this.last, this.scale, this.critical);
  }
}

/** Keeps a junction's next voltage where the exponential can be trusted: above the critical one, steps are taken in current. */
function nextJunctionVoltage(next: number, last: number, scale: number, critical: number): number {
  if (next <= critical || Math.abs(next - last) <= 2 * scale) return next;
  if (last > 0) {
    const growth = 1 + (next - last) / scale;
    return growth > 0 ? last + scale * Math.log(growth) : critical;
  }
  return next > 0 ? Math.max(scale * Math.log(next / scale), 0) : next;
}

function exponential(exponent: number): { value: number; slope: number } {
  const slope = Math.exp(Math.min(exponent, LARGEST_EXPONENT));
  return { value: slope * (1 + Math.max(0, exponent - LARGEST_EXPONENT)), slope };
}

/** The junction of the diode family at a temperature, degrees Celsius. */
export function junctionAt(
  params: Junction,
  celsius: number,
  beginsConducting = params.breakdownVoltage === null,
): JunctionCurrent {
  const { saturationCurrent, emissionCoefficient, bandgap, saturationTempExponent } = params;
  const actual = saturationCurrentAt(
    celsius,
    saturationCurrent,
    emissionCoefficient,
    bandgap,
    saturationTempExponent,
  );
  const vt = thermalVoltage(celsius);
  const { breakdownVoltage, breakdownCurrent } = params;
  const breakdown =
    breakdownVoltage === null
      ? null
      : { voltage: breakdownVoltage, current: breakdownCurrent, scale: vt };
  return new JunctionCurrent(actual, emissionCoefficient * vt, breakdown, beginsConducting);
}
