import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { pageMember } from "../../../../../lib/server/page-member";
import { reviewView } from "../../../../../lib/server/queries/review-view";
import { ReviewPage } from "../../../../review/review-page.client";
import {
  checkAction,
  closeAction,
  reopenAction,
  returnAction,
  signAction,
  waiveAction,
  withdrawAction,
} from "./actions";

interface Given {
  readonly params: Promise<{ readonly number: string; readonly letter: string }>;
}

export async function generateMetadata({ params }: Given): Promise<Metadata> {
  const { number, letter } = await params;
  return { title: `${number} Rev ${letter}` };
}

export default async function Page({ params }: Given) {
  const { number, letter } = await params;
  const member = await pageMember();
  const view = await reviewView(member, number, letter);
  if (!view.ok) notFound();
  const about = { number, letter };
  return (
    <ReviewPage
      view={view.value}
      actions={{
        check: checkAction.bind(null, about),
        close: closeAction.bind(null, about),
        reopen: reopenAction.bind(null, about),
        waive: waiveAction.bind(null, about),
        withdraw: withdrawAction.bind(null, about),
        sign: signAction.bind(null, about),
        giveBack: returnAction.bind(null, about),
      }}
    />
  );
}
