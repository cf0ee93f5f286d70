import { join } from 'node:path';
import { setDemoPrinterAddress } from '@/db/seed/benches';
import { startFakePrinter, type FakePrinter } from './files/fake-printer/fake-printer';
import { database } from './postgres';

/** The demo's label printer: keeps what it printed in the data folder's `printed`; its address is told to the stations. */
export async function startDemoPrinter(dataFolder: string): Promise<FakePrinter> {
  const printer = await startFakePrinter({ folder: join(dataFolder, 'printed'), port: 0 });
  await setDemoPrinterAddress(database(), printer.uri);
  return printer;
}
