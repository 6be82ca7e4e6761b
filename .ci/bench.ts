/** `npm run bench -- NAME`: figures as ratios measured in one run. Without NAME: the list. */
import { benchSolve } from "./bench/solve";
import { benchStart } from "./bench/start";

const BENCHES: Readonly<
  Record<string, { readonly what: string; readonly run: () => Promise<void> }>
> = {
  solve: {
    what: "the demo design in all conditions, against dense LU of ml-matrix on the same matrices",
    run: benchSolve,
  },
  start: {
    what: "npm start, from a bare and from a built clone, to an answered page",
    run: benchStart,
  },
};

const wanted = process.argv[2];
const bench = wanted === undefined ? undefined : BENCHES[wanted];
if (bench === undefined) {
  for (const [name, { what }] of Object.entries(BENCHES))
    process.stdout.write(`npm run bench -- ${name.padEnd(8)} ${what}\n`);
  process.exitCode = wanted === undefined ? 0 : 2;
} else {
  await bench.run();
}
