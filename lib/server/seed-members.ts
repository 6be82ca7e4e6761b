import { exportJWK, generateKeyPair } from "jose";
import { database } from "../database/client";
import { addPerson } from "./auth";
import { demoPeople } from "./demo-people";
import { type ActingMember, actingMember, type Proof, provePassword, signIn } from "./sign-in";

/** One of the demo's people, signed in with the own password like anybody else. */
export interface SeedPerson {
  readonly member: ActingMember;
  /** Gives the password again, as at a signature. */
  readonly prove: () => Promise<Proof>;
}

/** Makes the demo workspace with its key and its people, and signs each of them in. @returns them by first name */
export async function seedPeople(workspaceName: string): Promise<ReadonlyMap<string, SeedPerson>> {
  const { privateKey } = await generateKeyPair("EdDSA", { crv: "Ed25519", extractable: true });
  const key = await exportJWK(privateKey);
  const workspace = await database().workspace.create({
    data: { name: workspaceName, key: { create: { privateKey: { ...key } } } },
  });
  const people = new Map<string, SeedPerson>();
  for (const person of demoPeople) {
    const user = await addPerson(person);
    await database().member.create({
      data: { workspaceId: workspace.id, userId: user, roles: [...person.roles] },
    });
    people.set(person.name.split(" ")[0] ?? person.name, await signedIn(person));
  }
  return people;
}

async function signedIn(person: {
  readonly name: string;
  readonly email: string;
  readonly password: string;
}): Promise<SeedPerson> {
  const cookies = await signIn({ ...person, headers: new Headers() });
  if (!cookies.ok) throw new Error(`${person.name} cannot sign in: ${cookies.error}`);
  const cookie = cookies.value.map((one) => one.split(";", 1)[0]).join("; ");
  const member = await actingMember(new Headers({ cookie }));
  if (!member.ok) throw new Error(`${person.name} is ${member.error}`);
  return {
    member: member.value,
    prove: async () => {
      const proof = await provePassword(member.value, person.password);
      if (!proof.ok) throw new Error(`${person.name} cannot sign: ${proof.error}`);
      return proof.value;
    },
  };
}
