-- AddForeignKey
ALTER TABLE "Revision" ADD CONSTRAINT "Revision_runAddress_fkey" FOREIGN KEY ("runAddress") REFERENCES "SolverRun"("address") ON DELETE RESTRICT ON UPDATE CASCADE;

-- AddForeignKey
ALTER TABLE "Revision" ADD CONSTRAINT "Revision_comparisonAddress_fkey" FOREIGN KEY ("comparisonAddress") REFERENCES "SolverRun"("address") ON DELETE RESTRICT ON UPDATE CASCADE;
