import { startWorkspace } from "../tests/workspace-process";

/** Browser tests walk through what a newcomer gets from `npm start`: fresh data, free port, real worker. */
export default async function startRealServer(): Promise<() => Promise<void>> {
  const workspace = await startWorkspace();
  process.env["AMPERSIGN_E2E_URL"] = workspace.url;
  return () => workspace.stop();
}
