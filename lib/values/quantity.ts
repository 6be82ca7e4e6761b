/** What a value measures. Numbers are in the SI unit, temperatures in °C, angles in degrees. */
export type Quantity = keyof typeof quantities;

/** A unit as written: powers of ten to the SI unit, and whether an SI prefix may stand before it. */
export interface UnitRow {
  readonly exponent: number;
  readonly prefixed: boolean;
  /** For units that are not a power of ten away. */
  readonly convert?: (value: number) => number;
}

interface QuantityRow {
  /** For people; the first unit is the one to write. */
  readonly name: string;
  readonly units: Readonly<Record<string, UnitRow>>;
  /** Whether a prefix may stand without a unit, as in `4.7 k`. */
  readonly barePrefix: boolean;
}

const si: UnitRow = { exponent: 0, prefixed: true };
const plain: UnitRow = { exponent: 0, prefixed: false };
const percent: UnitRow = { exponent: -2, prefixed: false };
const partsPerMillion: UnitRow = { exponent: -6, prefixed: false };
const ZERO_CELSIUS = 273.15;

/**
 * Every quantity of a circuit file with the units that fit it. The ohm is U+03A9 here; U+2126 is
 * made equal to it before a unit is looked up, as the micro sign is to the Greek letter.
 */
export const quantities = {
  voltage: row("a voltage", { V: si }),
  current: row("a current", { A: si }),
  power: row("a power", { W: si }),
  resistance: row("a resistance", { Ω: si, ohm: si }),
  capacitance: row("a capacitance", { F: si }),
  inductance: row("an inductance", { H: si }),
  transconductance: row("a transconductance", { S: si, "A/V": si }),
  transresistance: row("a transresistance", { Ω: si, ohm: si, "V/A": si }),
  frequency: row("a frequency", { Hz: si }),
  time: row("a time", { s: si }),
  temperature: rowWithoutPrefix("a temperature", {
    "°C": plain,
    K: { ...plain, convert: (kelvin) => kelvin - ZERO_CELSIUS },
  }),
  kelvin: row("a temperature constant", { K: si }),
  angle: rowWithoutPrefix("an angle", {
    "°": plain,
    rad: { ...si, convert: (radians) => (radians * 180) / Math.PI },
  }),
  fraction: rowWithoutPrefix("a fraction", { "%": percent, ppm: partsPerMillion }),
  perKelvin: rowWithoutPrefix("a temperature coefficient", {
    "/K": plain,
    "1/K": plain,
    "%/K": percent,
    "ppm/K": partsPerMillion,
    "%": percent,
    ppm: partsPerMillion,
  }),
  perVolt: row("a channel modulation", { "/V": plain, "1/V": plain }),
  ratio: row("a ratio", {
    "V/V": plain,
    "A/A": plain,
    "%": percent,
    ppm: partsPerMillion,
  }),
  energy: row("an energy", { eV: si }),
  transconductanceFactor: row("a transconductance factor", { "A/V^2": si, "A/V²": si }),
  slewRate: row("a slew rate", {
    "V/s": si,
    "V/ms": { exponent: 3, prefixed: true },
    "V/us": { exponent: 6, prefixed: true },
  }),
  thermalResistance: rowWithoutPrefix("a thermal resistance", { "K/W": si, "°C/W": plain }),
  dissipation: rowWithoutPrefix("a dissipation constant", { "W/K": si, "W/°C": si }),
} satisfies Readonly<Record<string, QuantityRow>>;

/** Units that a file may write although no quantity of ours is measured in them alone. */
const OTHER_UNITS: Readonly<Record<string, UnitRow>> = {
  "V/K": si,
  "A/K": si,
  "Ω/K": si,
  "ohm/K": si,
};

/** Every unit that is known at all: one that does not fit is told apart from one that does not exist. */
export const allUnits: ReadonlyMap<string, UnitRow> = new Map(
  [OTHER_UNITS, ...Object.values(quantities).map((quantity) => quantity.units)].flatMap((units) =>
    Object.entries(units),
  ),
);

function row(name: string, units: Readonly<Record<string, UnitRow>>): QuantityRow {
  return { name, units, barePrefix: true };
}

function rowWithoutPrefix(name: string, units: Readonly<Record<string, UnitRow>>): QuantityRow {
  return { name, units, barePrefix: false };
}
