-- CreateTable
CREATE TABLE "Design" (
    "id" TEXT NOT NULL,
    "workspaceId" TEXT NOT NULL,
    "number" TEXT NOT NULL,
    "title" TEXT NOT NULL,
    "createdAt" TIMESTAMP(3) NOT NULL DEFAULT CURRENT_TIMESTAMP,

    CONSTRAINT "Design_pkey" PRIMARY KEY ("id")
);

-- CreateTable
CREATE TABLE "DocumentUpdate" (
    "designId" TEXT NOT NULL,
    "seq" BIGSERIAL NOT NULL,
    "bytes" BYTEA NOT NULL,
    "author" TEXT,
    "at" TIMESTAMP(3) NOT NULL DEFAULT CURRENT_TIMESTAMP,

    CONSTRAINT "DocumentUpdate_pkey" PRIMARY KEY ("designId","seq")
);

-- CreateTable
CREATE TABLE "DocumentSnapshot" (
    "designId" TEXT NOT NULL,
    "bytes" BYTEA NOT NULL,
    "at" TIMESTAMP(3) NOT NULL DEFAULT CURRENT_TIMESTAMP,

    CONSTRAINT "DocumentSnapshot_pkey" PRIMARY KEY ("designId")
);

-- CreateTable
CREATE TABLE "DocumentClientId" (
    "designId" TEXT NOT NULL,
    "clientId" BIGINT NOT NULL,
    "userId" TEXT NOT NULL,

    CONSTRAINT "DocumentClientId_pkey" PRIMARY KEY ("designId","clientId")
);

-- CreateTable
CREATE TABLE "Revision" (
    "id" TEXT NOT NULL,
    "designId" TEXT NOT NULL,
    "letter" TEXT NOT NULL,
    "circuit" TEXT NOT NULL,
    "digest" TEXT NOT NULL,
    "changeNote" TEXT NOT NULL,
    "authors" TEXT[],
    "frozenAt" TIMESTAMP(3) NOT NULL,
    "baseLetter" TEXT,
    "state" TEXT NOT NULL,
    "releasedAt" TIMESTAMP(3),
    "runAddress" TEXT NOT NULL,
    "comparisonAddress" TEXT NOT NULL,

    CONSTRAINT "Revision_pkey" PRIMARY KEY ("id")
);

-- CreateTable
CREATE TABLE "SolverRun" (
    "address" TEXT NOT NULL,
    "kind" TEXT NOT NULL,
    "state" TEXT NOT NULL,
    "proposed" TEXT NOT NULL,
    "base" TEXT,
    "lease" TEXT,
    "leaseUntil" TIMESTAMP(3),
    "attempts" INTEGER NOT NULL DEFAULT 0,
    "done" INTEGER NOT NULL DEFAULT 0,
    "of" INTEGER NOT NULL DEFAULT 0,
    "at" TEXT,
    "engine" TEXT NOT NULL,
    "result" TEXT,
    "resultDigest" TEXT,
    "failure" TEXT,
    "createdAt" TIMESTAMP(3) NOT NULL DEFAULT CURRENT_TIMESTAMP,
    "finishedAt" TIMESTAMP(3),

    CONSTRAINT "SolverRun_pkey" PRIMARY KEY ("address")
);

-- CreateTable
CREATE TABLE "Decision" (
    "id" TEXT NOT NULL,
    "designId" TEXT NOT NULL,
    "seq" BIGSERIAL NOT NULL,
    "kind" TEXT NOT NULL,
    "userId" TEXT NOT NULL,
    "at" TIMESTAMP(3) NOT NULL,
    "payload" JSONB NOT NULL,

    CONSTRAINT "Decision_pkey" PRIMARY KEY ("id")
);

-- CreateTable
CREATE TABLE "AuditEntry" (
    "workspaceId" TEXT NOT NULL,
    "seq" INTEGER NOT NULL,
    "at" TIMESTAMP(3) NOT NULL,
    "actor" TEXT NOT NULL,
    "action" TEXT NOT NULL,
    "subject" TEXT NOT NULL,
    "payload" JSONB NOT NULL,
    "previousHash" TEXT NOT NULL,
    "hash" TEXT NOT NULL,

    CONSTRAINT "AuditEntry_pkey" PRIMARY KEY ("workspaceId","seq")
);

-- CreateTable
CREATE TABLE "WorkspaceKey" (
    "workspaceId" TEXT NOT NULL,
    "privateKey" JSONB NOT NULL,
    "createdAt" TIMESTAMP(3) NOT NULL DEFAULT CURRENT_TIMESTAMP,

    CONSTRAINT "WorkspaceKey_pkey" PRIMARY KEY ("workspaceId")
);

-- CreateIndex
CREATE UNIQUE INDEX "Design_workspaceId_number_key" ON "Design"("workspaceId", "number");

-- CreateIndex
CREATE UNIQUE INDEX "Revision_designId_letter_key" ON "Revision"("designId", "letter");

-- CreateIndex
CREATE UNIQUE INDEX "Decision_seq_key" ON "Decision"("seq");

-- CreateIndex
CREATE INDEX "Decision_designId_seq_idx" ON "Decision"("designId", "seq");

-- AddForeignKey
ALTER TABLE "Design" ADD CONSTRAINT "Design_workspaceId_fkey" FOREIGN KEY ("workspaceId") REFERENCES "Workspace"("id") ON DELETE RESTRICT ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "DocumentUpdate" ADD CONSTRAINT "DocumentUpdate_designId_fkey" FOREIGN KEY ("designId") REFERENCES "Design"("id") ON DELETE RESTRICT ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "DocumentSnapshot" ADD CONSTRAINT "DocumentSnapshot_designId_fkey" FOREIGN KEY ("designId") REFERENCES "Design"("id") ON DELETE RESTRICT ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "DocumentClientId" ADD CONSTRAINT "DocumentClientId_designId_fkey" FOREIGN KEY ("designId") REFERENCES "Design"("id") ON DELETE RESTRICT ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "Revision" ADD CONSTRAINT "Revision_designId_fkey" FOREIGN KEY ("designId") REFERENCES "Design"("id") ON DELETE RESTRICT ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "Decision" ADD CONSTRAINT "Decision_designId_fkey" FOREIGN KEY ("designId") REFERENCES "Design"("id") ON DELETE RESTRICT ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "AuditEntry" ADD CONSTRAINT "AuditEntry_workspaceId_fkey" FOREIGN KEY ("workspaceId") REFERENCES "Workspace"("id") ON DELETE RESTRICT ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "WorkspaceKey" ADD CONSTRAINT "WorkspaceKey_workspaceId_fkey" FOREIGN KEY ("workspaceId") REFERENCES "Workspace"("id") ON DELETE RESTRICT ON UPDATE CASCADE;

-- What has been decided, logged or frozen stays: the database itself refuses to change it.
create function refuse_change() returns trigger language plpgsql as $$
begin
  raise exception '% rows are never changed or removed', tg_table_name using errcode = 'restrict_violation';
end $$;

create trigger decision_stays before update or delete on "Decision"
  for each row execute function refuse_change();
create trigger audit_entry_stays before update or delete on "AuditEntry"
  for each row execute function refuse_change();
create trigger document_update_stays before update on "DocumentUpdate"
  for each row execute function refuse_change();
create trigger revision_stays before delete on "Revision"
  for each row execute function refuse_change();

create function keep_revision() returns trigger language plpgsql as $$
begin
  if (new."designId", new."letter", new."circuit", new."digest", new."changeNote", new."authors", new."frozenAt", new."baseLetter")
     is distinct from
     (old."designId", old."letter", old."circuit", old."digest", old."changeNote", old."authors", old."frozenAt", old."baseLetter") then
    raise exception 'A frozen revision never changes' using errcode = 'restrict_violation';
  end if;
  return new;
end $$;

create trigger revision_is_frozen before update on "Revision"
  for each row execute function keep_revision();
