import type { Role } from "../review/review-state";

/** The people of the demo workspace, and how each signs in. They are no secret: the demo is for trying things out. */
export const demoPeople: readonly {
  readonly name: string;
  readonly email: string;
  readonly password: string;
  readonly roles: readonly Role[];
}[] = [
  {
    name: "Mara Holt",
    email: "mara.holt@hollow-lane.example",
    password: "draw-the-fan-relay",
    roles: ["designer"],
  },
  {
    name: "Jonas Reyes",
    email: "jonas.reyes@hollow-lane.example",
    password: "wire-the-tank-gauge",
    roles: ["designer", "reviewer"],
  },
  {
    name: "Idris Bello",
    email: "idris.bello@hollow-lane.example",
    password: "check-every-margin",
    roles: ["reviewer"],
  },
  {
    name: "Tove Lindqvist",
    email: "tove.lindqvist@hollow-lane.example",
    password: "sign-what-holds",
    roles: ["approver"],
  },
  {
    name: "Ana Kowal",
    email: "ana.kowal@hollow-lane.example",
    password: "read-the-record",
    roles: ["observer"],
  },
];
