import type * as Y from "yjs";
import type { FileBlock, FilePart } from "../circuit/circuit-file";
import type { NetLabel, Point, Sheet, SheetText, Wire, WireEnd } from "../circuit/drawing";
import { type DocumentEnd, endKey, endOf } from "./ends";
import { type NameAtEnd, namePins, type WireBetween } from "./net-names";
import { membersOf, objectOf, pointOf, textOf } from "./plain";
import type { BlockParts, DocumentPart } from "./project-parts";
import type { ProjectionProblem } from "./projection-problem";
import { topLevel } from "./shape";
import { isDrift, isFit, isParameter, isThermal, isWrittenValue, membersThat } from "./written";

interface Found {
  readonly block: FileBlock;
  readonly problems: readonly ProjectionProblem[];
}

/** A junction, label, wire or text of one block, by id. */
type Entries = readonly (readonly [id: string, entry: Readonly<Record<string, unknown>>])[];

/** One block of the file: its parts with the nets that wires and labels give them, and its drawing. */
export function projectBlock(
  doc: Y.Doc,
  name: string,
  parts: BlockParts,
  reference: string,
): Found {
  const problems: ProjectionProblem[] = [];
  const byId = new Map(parts.map((part) => [part.id, part]));
  const junctions = new Map<string, Point>();
  for (const [id, entry] of entriesIn(doc, "junctions", name)) {
    const at = pointOf(entry["at"]);
    if (at !== null) junctions.set(id, at);
  }
  const there = (end: DocumentEnd | null): end is DocumentEnd =>
    end !== null &&
    ("junction" in end
      ? junctions.has(end.junction)
      : byId.get(end.part)?.pins.includes(end.pin) === true);

  const wires: WireBetween[] = [];
  for (const [, entry] of entriesIn(doc, "wires", name)) {
    const [a, b] = [endOf(entry["a"]), endOf(entry["b"])];
    if (there(a) && there(b)) wires.push({ a, b });
    else
      problems.push({
        code: "looseEnd",
        block: name,
        message: `A wire ends at ${endWords(there(a) ? b : a, byId)}, which is not there any longer; it is left out. Draw it again where it belongs.`,
      });
  }
  const labels = labelsOf(entriesIn(doc, "labels", name), there);
  const pins = parts.flatMap((part) =>
    part.pins.map((pin) => ({ part: part.id, designator: part.designator, pin })),
  );
  const names: readonly NameAtEnd[] = labels.map(({ label, end }) => ({ net: label.net, end }));
  const named = namePins(pins, wires, names, reference, name);
  problems.push(...named.problems);
  const settings = objectOf(topLevel(doc, "blocks").get(name)) ?? {};
  const ports = settings["ports"];
  const fileEnd = (end: DocumentEnd): WireEnd =>
    "junction" in end ? end : { part: byId.get(end.part)?.designator ?? end.part, pin: end.pin };
  return {
    block: {
      ...(Array.isArray(ports) && { ports: ports.filter(isText) }),
      parts: parts.map((part) => filePart(part, named.netOfPin, byId)),
      wires: wires.map(({ a, b }): Wire => ({ a: fileEnd(a), b: fileEnd(b) })),
      sheet: {
        size: sizeOf(settings["size"]),
        junctions: Object.fromEntries(junctions),
        labels: labels.map(({ label, end }) => ({ ...label, end: fileEnd(end) })),
        texts: textsOf(entriesIn(doc, "texts", name)),
      },
    },
    problems,
  };
}

interface LabelAtEnd {
  readonly label: Omit<NetLabel, "end">;
  readonly end: DocumentEnd;
}

/** Labels whose end is there and whose name can be one; a label goes with the part it was on. */
function labelsOf(
  entries: Entries,
  there: (end: DocumentEnd | null) => end is DocumentEnd,
): readonly LabelAtEnd[] {
  return entries.flatMap(([, entry]): readonly LabelAtEnd[] => {
    const end = endOf(entry["end"]);
    const net = textOf(entry["net"]);
    if (!there(end) || net === null || net === "" || /[/.\p{Cc}]/u.test(net)) return [];
    const shape =
      entry["shape"] === "ground" || entry["shape"] === "flag" ? entry["shape"] : "name";
    return [{ label: { shape, net, at: pointOf(entry["at"]) ?? [0, 0] }, end }];
  });
}

function filePart(
  part: DocumentPart,
  netOfPin: ReadonlyMap<string, string | null>,
  byId: ReadonlyMap<string, DocumentPart>,
): FilePart {
  const { map } = part;
  const has = <T>(key: string, accepts: (value: unknown) => value is T): T | undefined => {
    const value = map.get(key);
    return accepts(value) ? value : undefined;
  };
  const params = membersThat(membersOf(map.get("params")), isParameter);
  const ratings = membersThat(membersOf(map.get("ratings")), isWrittenValue);
  const tolerances = membersThat(membersOf(map.get("tolerances")), isWrittenValue);
  const set = membersThat(membersOf(map.get("set")), isParameter);
  const thermal = has("thermal", isThermal);
  const style = has("style", isText);
  const fit = has("fit", isFit);
  const drift = has("drift", isDrift);
  const temperature = has("temperature", isWrittenValue);
  const note = has("note", isText);
  const block = has("uses", isText);
  const control = has("control", isText);
  const of = map.get("of");
  const nameOf = (id: string): string => byId.get(id)?.designator ?? id;
  const place = placeOf(map.get("at"));
  return {
    ref: part.designator,
    kind: part.kind,
    id: part.id,
    pins: Object.fromEntries(
      part.pins.map((pin) => [pin, netOfPin.get(endKey({ part: part.id, pin })) ?? null]),
    ),
    ...(Object.keys(params).length > 0 && { params }),
    ...(Object.keys(ratings).length > 0 && { ratings }),
    ...(Object.keys(tolerances).length > 0 && { tolerances }),
    ...(Object.keys(set).length > 0 && { set }),
    ...(thermal !== undefined && { thermal }),
    ...(style !== undefined && { style }),
    ...(fit !== undefined && { fit }),
    ...(drift !== undefined && { drift }),
    ...(temperature !== undefined && { temperature }),
    ...(map.get("fitted") === false && { fitted: false }),
    ...(note !== undefined && { note }),
    ...(block !== undefined && { block }),
    ...(control !== undefined && { control: nameOf(control) }),
    ...(Array.isArray(of) &&
      isText(of[0]) &&
      isText(of[1]) && { of: [nameOf(of[0]), nameOf(of[1])] as const }),
    ...place,
  };
}

function placeOf(value: unknown): Pick<FilePart, "at" | "turn" | "mirror"> {
  const at = pointOf(value);
  if (at === null || !Array.isArray(value)) return {};
  const turn = value[2];
  return {
    at,
    ...((turn === 1 || turn === 2 || turn === 3) && { turn }),
    ...(value[3] === true && { mirror: true }),
  };
}

function textsOf(entries: Entries): readonly SheetText[] {
  return entries.flatMap(([, entry]): readonly SheetText[] => {
    const at = pointOf(entry["at"]);
    const text = textOf(entry["text"]);
    if (at === null || text === null) return [];
    return [{ at, text, style: entry["style"] === "heading" ? "heading" : "note" }];
  });
}

function entriesIn(
  doc: Y.Doc,
  name: "junctions" | "wires" | "labels" | "texts",
  block: string,
): Entries {
  return [...topLevel(doc, name).entries()]
    .flatMap(([id, value]): Entries => {
      const entry = objectOf(value);
      return entry !== null && entry["block"] === block ? [[id, entry]] : [];
    })
    .sort(([a], [b]) => (a < b ? -1 : 1));
}

function sizeOf(value: unknown): Sheet["size"] {
  const sizes: readonly Sheet["size"][] = ["A4", "A3", "A2", "A1", "A0"];
  return sizes.find((size) => size === value) ?? "A3";
}

function isText(value: unknown): value is string {
  return typeof value === "string";
}

function endWords(end: DocumentEnd | null, byId: ReadonlyMap<string, DocumentPart>): string {
  if (end === null || "junction" in end) return "a junction";
  const part = byId.get(end.part);
  return part === undefined ? "a part" : `${part.designator} pin ${end.pin}`;
}
