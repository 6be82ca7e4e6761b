import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { pageMember } from "../../../lib/server/page-member";
import { Mast } from "../../mast/mast";
import { createDesignAction } from "./actions";
import { NewDesignForm } from "./new-design-form.client";

export const metadata: Metadata = { title: "New design" };

export default async function Page() {
  const member = await pageMember();
  if (!member.roles.includes("designer")) notFound();
  return (
    <>
      <Mast title="New design" subtitle="from a circuit file, or from an empty sheet" />
      <main className="newdesign">
        <NewDesignForm create={createDesignAction} />
      </main>
    </>
  );
}
