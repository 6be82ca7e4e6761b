import type { Metadata } from "next";
import { notFound } from "next/navigation";
import { pageMember } from "../../../../../../lib/server/page-member";
import { sealedRecord } from "../../../../../../lib/server/queries/sealed-record";
import { Mast } from "../../../../../mast/mast";
import { recordOutline } from "../../../../../record/outline";
import { RecordPaper } from "../../../../../record/record-paper";
import { cautions } from "../../../../../wording/cautions";

interface Given {
  readonly params: Promise<{ readonly number: string; readonly letter: string }>;
}

export async function generateMetadata({ params }: Given): Promise<Metadata> {
  const { number, letter } = await params;
  return { title: `${number} Rev ${letter} record` };
}

export default async function Page({ params }: Given) {
  const { number, letter } = await params;
  const member = await pageMember();
  const sealed = await sealedRecord(member, number, letter, cautions);
  if (!sealed.ok && sealed.error.kind === "notFound") notFound();
  const here = `/designs/${number}/reviews/${letter}`;
  return (
    <>
      <Mast
        number={number}
        title={`Review record, Rev ${letter}`}
        subtitle="as printed, A4"
        actions={
          <>
            <a className="btn noprint" href={here}>
              Review
            </a>
            {sealed.ok && (
              <>
                <a className="btn noprint" href={`${here}/record/json`}>
                  Record as JSON
                </a>
                <a className="btn main noprint" href={`${here}/record/pdf`}>
                  Record as PDF
                </a>
              </>
            )}
          </>
        }
      />
      {sealed.ok ? (
        <RecordPaper outline={recordOutline(sealed.value)} />
      ) : (
        <main className="opening">
          <p>The worker has not finished this revision yet: there is nothing to put on record.</p>
        </main>
      )}
    </>
  );
}
