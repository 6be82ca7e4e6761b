import type { Story } from "./seed-steps";

/** Further designs of the demo workspace, in other states. */
export async function seedOthers(_story: Story): Promise<void> {
  await Promise.resolve();
}
