import { openDatabase } from '@/db/client';
import { objectStore } from './files/storage/object-store';
import { readStoredHeads } from './operations/trail/stored-heads';
import { verifyTrail } from './operations/trail/verify-trail';

/**
 * `npm run verify-trail`: recomputes every seal and every hash of a closed run, against the heads kept in the database
 * and, where S3_BUCKET names it, in object storage. A line a chain; ends with 1 and what is wrong first
 * when a chain is broken, with 2 when the database does not answer.
 */
async function main(): Promise<void> {
  const url = process.env.DATABASE_URL!;
  const { db, pool } = openDatabase(url, 2);
  try {
    const known = process.env.S3_BUCKET ? await readStoredHeads(objectStore()!, new Date()) : [];
    const report = await verifyTrail(db, { runs: true, known });
    for (const { chain, entries, broken } of report.chains)
      console.log(
        `${broken ? 'BROKEN ' : 'whole  '} ${chain}: ${entries} entries${broken ? `. ${broken.sentence}` : ''}`,
      );
    for (const { sentence } of report.breaks.filter(({ chain }) => chain === 'none'))
      console.log(`BROKEN  ${sentence}`);
    console.log(`${report.entries} entries and ${report.runs} closed runs checked, ${report.breaks.length} breaks`);
    process.exitCode = report.breaks.length > 0 ? 1 : 0;
  } finally {
    await pool.end();
  }
}

main().catch((error: unknown) => {
  console.error(error instanceof Error ? error.message : error);
  process.exitCode = 2;
});
