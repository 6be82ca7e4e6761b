import { startTimes } from "../start-time";

/** Prints the start times beside their goals. */
export async function benchStart(): Promise<void> {
  for (const { from, seconds, goalSeconds } of await startTimes())
    process.stdout.write(
      `${from.padEnd(20)} ${seconds.toFixed(1).padStart(6)} s   goal ${goalSeconds} s   ratio ${(seconds / goalSeconds).toFixed(2)}\n`,
    );
}
