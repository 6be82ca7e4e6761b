import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { pageMember } from "../../../lib/server/page-member";
import { draftView } from "../../../lib/server/queries/draft-view";
import { DraftPage } from "../../draft/draft-page.client";
import { freezeAction } from "./actions";

interface Given {
  readonly params: Promise<{ readonly number: string }>;
}

export async function generateMetadata({ params }: Given): Promise<Metadata> {
  const { number } = await params;
  return { title: `${number} draft` };
}

export default async function Page({ params }: Given) {
  const { number } = await params;
  const member = await pageMember();
  const view = await draftView(member, number);
  if (!view.ok) notFound();
  return <DraftPage view={view.value} freeze={freezeAction.bind(null, number)} />;
}
