import { readCircuitFile } from "../../lib/kinds/read-circuit";
import { judge } from "../../lib/stress/judge";
import type { PreviewAnswer, PreviewQuestion, PreviewReply } from "./preview-answer";

/** The same engine as on the server, in a thread of the browser: solves a draft, never blocking the page. */
self.addEventListener("message", (event: MessageEvent<PreviewQuestion>) => {
  const reply: PreviewReply = { number: event.data.number, answer: answer(event.data.file) };
  self.postMessage(reply);
});

function answer(file: unknown): PreviewAnswer {
  const started = performance.now();
  const circuit = readCircuitFile(file);
  if (!circuit.ok) return { kind: "badFile", problems: circuit.error };
  const result = judge(circuit.value, { everyCondition: true });
  return { kind: "solved", result, milliseconds: performance.now() - started };
}
