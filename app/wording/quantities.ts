/** How rated quantities are called on pages, and their units. */
const QUANTITIES: Readonly<Record<string, { readonly name: string; readonly unit: string }>> = {
  voltage: { name: "voltage", unit: "V" },
  current: { name: "current", unit: "A" },
  power: { name: "power", unit: "W" },
  temperature: { name: "temperature", unit: "°C" },
  junctionTemperature: { name: "junction temperature", unit: "°C" },
  reverseVoltage: { name: "reverse voltage", unit: "V" },
  forwardCurrent: { name: "forward current", unit: "A" },
  surgeCurrent: { name: "surge current", unit: "A" },
  collectorCurrent: { name: "collector current", unit: "A" },
  collectorEmitterVoltage: { name: "voltage collector to emitter", unit: "V" },
  drainCurrent: { name: "drain current", unit: "A" },
  drainSourceVoltage: { name: "voltage drain to source", unit: "V" },
  drainGateVoltage: { name: "voltage drain to gate", unit: "V" },
  gateSourceVoltage: { name: "voltage gate to source", unit: "V" },
  supplyVoltage: { name: "supply voltage", unit: "V" },
  inputVoltage: { name: "input voltage", unit: "V" },
  outputCurrent: { name: "output current", unit: "A" },
  rippleCurrent: { name: "ripple current", unit: "A" },
  saturationCurrent: { name: "peak current", unit: "A" },
};

/** The quantity in words: `junction temperature`. An unlisted one is spelt out from its name. */
export function quantityName(quantity: string): string {
  return (
    QUANTITIES[quantity]?.name ?? quantity.replace(/[A-Z]/g, (letter) => ` ${letter.toLowerCase()}`)
  );
}

/** The quantity's unit, empty where it has none. */
export function quantityUnit(quantity: string): string {
  return QUANTITIES[quantity]?.unit ?? "";
}
