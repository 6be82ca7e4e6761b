/** Parameters and ratings as a drawing office calls them. One without a row is spelt out from its name. */
const NAMES: Readonly<Record<string, string>> = {
  dc: "DC value",
  ac: "AC magnitude",
  acPhase: "AC phase",
  tempco: "Temp. coefficient",
  seriesResistance: "Series resistance",
  resistance25: "Resistance at 25 °C",
  beta: "B constant",
};

/** `forwardGain` as `Forward gain`. */
export function parameterName(name: string): string {
  const known = NAMES[name];
  if (known !== undefined) return known;
  const spelt = name.replace(/[A-Z]/g, (letter) => ` ${letter.toLowerCase()}`);
  return spelt.charAt(0).toUpperCase() + spelt.slice(1);
}
