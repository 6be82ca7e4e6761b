import fc from "fast-check";
import { expect, it } from "vitest";
import { SaveCount } from "../../app/collaboration/save-count";

it("does not take a frame before the answer for what was made without a line", () => {
  const count = new SaveCount();
  count.add(1);
  count.lineOpened();
  count.add(1);
  // A deletion builds on nothing that is missing: the server stores it although the first edit is not there.
  count.frameSent("update");
  count.framesStored(1);
  expect([count.isSaved, count.unsaved]).toEqual([false, 2]);
  count.frameSent("answer");
  count.framesStored(2);
  expect([count.isSaved, count.unsaved]).toEqual([true, 0]);
});

it("does not take an edit that was not sent for one that was", () => {
  const count = new SaveCount();
  count.lineOpened();
  count.frameSent("answer");
  count.add(1);
  count.framesStored(1);
  expect([count.isSaved, count.unsaved]).toEqual([false, 1]);
});

it("says saved only of what an honest server has stored, whatever breaks off when", () => {
  const step = fc.constantFrom("edit", "open", "answer", "store");
  fc.assert(
    fc.property(fc.array(step, { maxLength: 60 }), (steps) => {
      const count = new SaveCount();
      let made = 0;
      let stored = 0;
      let line: { readonly brings: number[]; answered: boolean; done: number } | null = null;
      for (const what of steps) {
        if (what === "open") {
          line = { brings: [], answered: false, done: 0 };
          count.lineOpened();
        } else if (what === "edit") {
          made += 1;
          count.add(1);
          if (line === null) continue;
          count.frameSent("update");
          // Before the answer a frame alone does not bring what was made earlier.
          line.brings.push(line.answered ? made : 0);
        } else if (what === "answer" && line !== null && !line.answered) {
          line.answered = true;
          count.frameSent("answer");
          line.brings.push(made);
        } else if (what === "store" && line !== null && line.done < line.brings.length) {
          line.done += 1;
          stored = Math.max(stored, line.brings[line.done - 1] ?? 0);
          count.framesStored(line.done);
        }
        if (count.isSaved) expect(stored).toBe(made);
        expect(count.unsaved).toBeGreaterThanOrEqual(made - stored);
      }
    }),
  );
});
