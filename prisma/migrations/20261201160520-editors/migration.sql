-- CreateTable
CREATE TABLE "DraftEditor" (
    "designId" TEXT NOT NULL,
    "userId" TEXT NOT NULL,
    "lastAt" TIMESTAMP(3) NOT NULL,

    CONSTRAINT "DraftEditor_pkey" PRIMARY KEY ("designId","userId")
);

-- AddForeignKey
ALTER TABLE "DraftEditor" ADD CONSTRAINT "DraftEditor_designId_fkey" FOREIGN KEY ("designId") REFERENCES "Design"("id") ON DELETE RESTRICT ON UPDATE CASCADE;

-- What a signature stands on cannot be exchanged behind it.
create or replace function keep_revision() returns trigger language plpgsql as $$
begin
  if (new."id", new."designId", new."letter", new."circuit", new."digest", new."changeNote", new."authors",
      new."frozenAt", new."baseLetter", new."runAddress", new."comparisonAddress")
     is distinct from
     (old."id", old."designId", old."letter", old."circuit", old."digest", old."changeNote", old."authors",
      old."frozenAt", old."baseLetter", old."runAddress", old."comparisonAddress") then
    raise exception 'A frozen revision never changes' using errcode = 'restrict_violation';
  end if;
  return new;
end $$;

create function keep_result() returns trigger language plpgsql as $$
begin
  if old."state" = 'done' then
    raise exception 'A finished run never changes' using errcode = 'restrict_violation';
  end if;
  return new;
end $$;

create trigger solver_run_stays before update or delete on "SolverRun"
  for each row when (old."state" = 'done') execute function keep_result();

create trigger decision_table_stays before truncate on "Decision" execute function refuse_change();
create trigger audit_entry_table_stays before truncate on "AuditEntry" execute function refuse_change();
create trigger revision_table_stays before truncate on "Revision" execute function refuse_change();
