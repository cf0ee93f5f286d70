import { isUniqueViolation } from '@/db/errors';
import {
  findPrinter,
  insertPrinter,
  listPrinters,
  listStationRows,
  listStationsOfPrinter,
  updatePrinter,
} from '@/db/queries/station-settings';
import { insertTrail } from '@/db/queries/trail';
import type { Actor } from '@/lib/access/actor';
import { done, refusal, type Outcome } from '@/lib/contracts/outcome';
import { database } from '@/server/postgres';

const words = new Intl.ListFormat('en-GB', { type: 'conjunction' });

export interface PrinterListItem {
  printerId: string;
  name: string;
  uri: string;
  stationCodes: string[];
  retiredIso: string | null;
}

export async function listPrinterSettings(): Promise<PrinterListItem[]> {
  const [rows, stations] = await Promise.all([listPrinters(database()), listStationRows(database())]);
  return rows.map((row) => ({
    printerId: row.id,
    name: row.name,
    uri: row.uri,
    stationCodes: stations.filter((s) => s.printerId === row.id && !s.retiredAt).map((s) => s.code),
    retiredIso: row.retiredAt?.toISOString() ?? null,
  }));
}

/** Adds a printer (`printerId` null) or changes one. Codes: printer-unknown, printer-exists. */
export async function savePrinter(
  actor: Actor,
  form: { printerId: string | null; name: string; uri: string },
): Promise<Outcome> {
  const { printerId, name, uri } = form;
  try {
    return await database().transaction(async (tx) => {
      const before = printerId ? await findPrinter(tx, printerId) : null;
      if (printerId && !before) return refusal('printer-unknown', 'This printer does not exist.');
      const after = before ? await updatePrinter(tx, before.id, { name, uri }) : await insertPrinter(tx, { name, uri });
      await insertTrail(tx, actor, {
        action: before ? 'printer.changed' : 'printer.added',
        entity: 'printer',
        entityId: after.id,
        before: before && { name: before.name, uri: before.uri },
        after: { name, uri },
      });
      return done;
    });
  } catch (error) {
    if (isUniqueViolation(error)) return refusal('printer-exists', 'Another printer has this name.', 'name');
    throw error;
  }
}

/** Takes a printer out of use. Codes: printer-unknown, printer-in-use. */
export async function retirePrinter(actor: Actor, form: { printerId: string }): Promise<Outcome> {
  return database().transaction(async (tx) => {
    const printer = await findPrinter(tx, form.printerId);
    if (!printer) return refusal('printer-unknown', 'This printer does not exist.');
    const users = await listStationsOfPrinter(tx, printer.id);
    if (users.length > 0)
      return refusal('printer-in-use', `${words.format(users)} print here. Choose another printer for them first.`);
    if (printer.retiredAt) return done;
    await updatePrinter(tx, printer.id, { retiredAt: new Date() });
    await insertTrail(tx, actor, {
      action: 'printer.retired',
      entity: 'printer',
      entityId: printer.id,
      before: { name: printer.name, retired: false },
      after: { name: printer.name, retired: true },
    });
    return done;
  });
}
