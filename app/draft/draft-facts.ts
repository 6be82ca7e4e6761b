import type { DraftView } from "../../lib/review/views";
import type { NetReading, SheetFacts } from "../../lib/sheet/sheet-facts";
import type { CircuitResult } from "../../lib/stress/circuit-result";
import { netLimit } from "../review/net-rows";
import type { TitleFacts } from "../sheet/title-facts";
import { voltageWords } from "../wording/numbers";

/** A voltage that moved by less than this since the last edit stands still. */
const STILL = 5e-4;

/** What a draft's sheet shows: the preview's voltages, was and is where the last edit moved them. */
export function draftFacts(
  view: DraftView,
  result: CircuitResult | null,
  before: CircuitResult | null,
  condition: string,
): SheetFacts {
  const is = result?.conditions.find((one) => one.name === condition)?.nets ?? {};
  const was = before?.conditions.find((one) => one.name === condition)?.nets ?? {};
  const netReadings = Object.entries(is)
    .filter(([net]) => net !== result?.reference)
    .map(([net, volts]): NetReading => {
      const old = was[net] ?? null;
      const moved = old !== null && volts !== null && Math.abs(volts - old) > STILL;
      const past = netLimit(result, net, condition)?.verdict === "fail";
      return {
        net,
        level: past ? "past" : moved ? "moved" : "quiet",
        is: `${voltageWords(volts)} V`,
        ...(moved && { was: voltageWords(old) }),
      };
    });
  return {
    netReadings,
    titleBlock: "short",
    ...(view.design.revisions.length > 0 && { revisionRows: 1 }),
  };
}

/** The title block of a draft. */
export function draftTitle(view: DraftView): TitleFacts {
  return {
    owner: view.design.workspace,
    title: view.design.title,
    documentType: "Circuit sheet",
    creator: view.people
      .filter((person) => person.roles.includes("designer"))
      .map((person) => person.name)
      .join(", "),
    status: "Draft",
    number: view.design.number,
    revision: "–",
    dated: "Issued",
    date: "not issued",
    sheet: "1 / 1",
  };
}
