import type { Point } from "../circuit/drawing";
import type { Box } from "../kinds/part-symbol";
import { drawBalloon } from "./balloons";
import { grown, lineBox } from "./box";
import type { ClearSpace } from "./clear-space";
import { letterQuietNet } from "./letter-nets";
import { boxNet, boxPart } from "./number-box";
import type {
  Balloon,
  Cloud,
  DrawnNet,
  DrawnPart,
  DrawnWire,
  PartTag,
  Segment,
  Tag,
} from "./sheet-drawing";
import type { FindingMark, NetReading, ReadingLevel, SheetFacts } from "./sheet-facts";
import { type Paper, zoneAt } from "./zones";

/** The loudest is set first, where there is most room. */
const LOUDEST_FIRST: readonly ReadingLevel[] = ["past", "moved", "quiet"];

interface NetSetting {
  readonly sheet: Paper;
  readonly space: ClearSpace;
  /** Nets whose name stands on the sheet already. */
  readonly named: ReadonlySet<string>;
  readonly reference: string | null;
}

/** Sets the name and the number of every net that is drawn, and puts the nets in reading order. */
export function drawNets(
  facts: SheetFacts,
  parts: readonly DrawnPart[],
  wires: readonly DrawnWire[],
  { sheet, space, named, reference }: NetSetting,
): readonly DrawnNet[] {
  const readings = new Map((facts.netReadings ?? []).map((reading) => [reading.net, reading]));
  const segments = segmentsByNet(parts, wires);
  const level = (net: string): ReadingLevel => readings.get(net)?.level ?? "quiet";
  const names = [...segments.keys()].filter((net) => net !== reference);
  const tags = new Map<string, Tag | null>();
  for (const wanted of LOUDEST_FIRST) {
    for (const net of names.filter((name) => level(name) === wanted)) {
      tags.set(net, tagFor(net, readings.get(net) ?? null, segments.get(net) ?? [], named, space));
    }
  }
  return names
    .map((net): DrawnNet => {
      const at = firstPlace(segments.get(net) ?? []);
      return {
        net,
        at,
        zone: zoneAt(sheet, at),
        tag: tags.get(net) ?? null,
        reading: readings.get(net) ?? null,
      };
    })
    .sort((one, other) => readingOrder(one.at, other.at));
}

function tagFor(
  net: string,
  reading: NetReading | null,
  wires: readonly Segment[],
  named: ReadonlySet<string>,
  space: ClearSpace,
): Tag | null {
  if (reading !== null && reading.level !== "quiet") return boxNet(reading, wires, space);
  const name = named.has(net) ? null : net;
  if (name === null && reading === null) return null;
  return letterQuietNet(name, reading?.is ?? null, wires, space);
}

/** Left to right in bands of the sheet, downward. */
export function readingOrder(one: Point, other: Point): number {
  const band = Math.floor(one[1] / 100) - Math.floor(other[1] / 100);
  return band !== 0 ? band : one[0] - other[0] || one[1] - other[1];
}

/** The runs of every net; a net without a wire has its pins, as runs of no length. */
function segmentsByNet(
  parts: readonly DrawnPart[],
  wires: readonly DrawnWire[],
): ReadonlyMap<string, Segment[]> {
  const nets = new Map<string, Segment[]>();
  const add = (net: string | null, segment: Segment): void => {
    if (net !== null) nets.set(net, [...(nets.get(net) ?? []), segment]);
  };
  for (const { net, points, removed } of wires) {
    if (removed) continue;
    points.slice(1).forEach((point, index) => {
      add(net, [points[index] ?? point, point]);
    });
  }
  for (const { pins, removed } of parts) {
    for (const { net, at } of removed ? [] : pins) {
      if (net !== null && !nets.has(net)) add(net, [at, at]);
    }
  }
  return nets;
}

function firstPlace(segments: readonly Segment[]): Point {
  const points = segments.map(([from]) => from);
  return points.sort(readingOrder)[0] ?? [0, 0];
}

export function drawPartTags(
  facts: SheetFacts,
  parts: readonly DrawnPart[],
  space: ClearSpace,
): readonly PartTag[] {
  return (facts.partReadings ?? []).flatMap((reading) => {
    const part = parts.find(({ ref, removed }) => ref === reading.part && !removed);
    if (part === undefined) return [];
    const [, top, , bottom] = part.box;
    const [x] = part.at;
    const tag = boxPart(reading, [[x, top] as const, [x, bottom] as const], space);
    return tag === null ? [] : [{ ...tag, part: part.ref }];
  });
}

interface Drawn {
  readonly parts: readonly DrawnPart[];
  readonly nets: readonly DrawnNet[];
  readonly partTags: readonly PartTag[];
  readonly clouds: readonly Cloud[];
  readonly sheet: Paper;
  readonly space: ClearSpace;
}

/** A balloon for every finding whose net or part is on this sheet. */
export function drawBalloons(facts: SheetFacts, drawn: Drawn): readonly Balloon[] {
  return (facts.findings ?? []).flatMap((finding) => {
    const target = targetOf(finding, drawn);
    if (target === null) return [];
    const at: Point = [target[0], target[1]];
    const balloon = drawBalloon(finding, target, zoneAt(drawn.sheet, at), drawn.space);
    return balloon === null ? [] : [balloon];
  });
}

/** The number if it stands in a box, else the cloud, else the part or the wire itself. */
function targetOf({ anchor }: FindingMark, { parts, nets, partTags, clouds }: Drawn): Box | null {
  if ("net" in anchor) {
    const net = nets.find((one) => one.net === anchor.net);
    if (net === undefined) return null;
    return net.tag?.box ?? lineBox(net.at, net.at, 1);
  }
  const tag = partTags.find(({ part }) => part === anchor.part);
  const cloud = clouds.find((one) => one.parts.includes(anchor.part));
  const part = parts.find(({ ref }) => ref === anchor.part);
  return tag?.box ?? cloud?.box ?? (part === undefined ? null : bodyOf(part));
}

/** An amplifier's pins stand far out: its triangle is what a line should reach. */
function bodyOf({ box }: DrawnPart): Box {
  return box[2] - box[0] >= 60 && box[3] - box[1] >= 60 ? grown(box, -8) : box;
}
