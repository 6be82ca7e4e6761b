/** Fills an empty database with the demo: a story told through the same commands that people use. Ends at once where there is data. */
import { database } from "../database/client";
import { removePart, setParameter } from "../document/edits";
import { seedPeople } from "./seed-members";
import { seedOthers } from "./seed-others";
import { checkOff, draw, edit, freeze, openStory, type Story, signAll, waive } from "./seed-steps";

const FAN = "FFC-2";

async function seedDemo(): Promise<void> {
  if ((await database().workspace.count()) > 0) return;
  process.stdout.write("Seeding the demo: Hollow Lane Instruments …\n");
  const story = openStory(await seedPeople("Hollow Lane Instruments"));
  await fanController(story);
  await seedOthers(story);
  await story.computer.close();
}

/** Rev A and B are released; C, with a larger relay, waits for review. */
async function fanController(story: Story): Promise<void> {
  const design = await draw(story, "Mara", {
    number: FAN,
    file: "ffc-2-A.json",
    at: "2026-09-01T08:00:00.000Z",
  });
  await freeze(story, "Mara", FAN, "First issue", "2026-09-03T09:10:00.000Z");
  await waive(
    story,
    "Tove",
    { number: FAN, letter: "A", at: "2026-09-04T07:30:00.000Z" },
    { part: "K1", rule: "cp-relay-coil", condition: "Cold crank" },
    "The fan need not start while the engine cranks; the coil has its full voltage again within two seconds.",
  );
  await checkOff(story, "Idris", FAN, "A", "2026-09-04T12:00:00.000Z");
  await signAll(story, FAN, "A", [
    ["Mara", "authored", "2026-09-04T13:00:00.000Z"],
    ["Idris", "reviewed", "2026-09-04T14:06:00.000Z"],
    ["Tove", "approved", "2026-09-05T07:52:00.000Z"],
  ]);

  await edit(story, "Mara", design, (doc, part) => {
    setParameter(doc, part("R1"), "resistance", "4k7");
    setParameter(doc, part("R7"), "resistance", "30k");
  });
  await freeze(
    story,
    "Mara",
    FAN,
    "Trip point set to 2.3 °C; more zener current",
    "2026-10-12T10:15:00.000Z",
  );
  await checkOff(story, "Idris", FAN, "B", "2026-10-13T09:12:00.000Z");
  await signAll(story, FAN, "B", [
    ["Mara", "authored", "2026-10-12T15:20:00.000Z"],
    ["Idris", "reviewed", "2026-10-13T14:06:00.000Z"],
    ["Tove", "approved", "2026-10-14T07:52:00.000Z"],
  ]);

  await edit(story, "Mara", design, (doc, part) => {
    setParameter(doc, part("R7"), "resistance", "33k");
    setParameter(doc, part("R9"), "resistance", "4k7");
    setParameter(doc, part("K1"), "resistance", "220 Ω");
    setParameter(doc, part("K1"), "inductance", "0.4 H");
    removePart(doc, part("C3"));
  });
  await freeze(story, "Mara", FAN, "Larger relay; trip nearer 0 °C", "2026-11-27T09:00:00.000Z");
  await signAll(story, FAN, "C", [["Mara", "authored", "2026-11-27T09:20:00.000Z"]]);
}

await seedDemo();
await database().$disconnect();
process.exit(0);
