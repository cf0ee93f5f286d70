import { findStationByCode, listPrinters, listStationRows } from '@/db/queries/station-settings';
import type { StationForm } from '@/lib/contracts/station-settings';
import { linkHasController, type StationLink } from '@/lib/contracts/station-link';
import { database } from '@/server/postgres';

export interface StationListItem {
  code: string;
  name: string;
  fixture: string;
  link: string;
  hasController: boolean;
  hasWiperProbe: boolean;
  printer: string | null;
  enrolledBrowsers: number;
  retiredIso: string | null;
}

/** How a station is reached, in a few words. */
function linkWords(link: StationLink): string {
  const rate = `${link.baudRate.toLocaleString('en-GB')} baud`;
  return link.kind === 'simulated' ? `simulated, ${rate}` : `serial, ${rate}`;
}

export async function listStationSettings(): Promise<StationListItem[]> {
  const rows = await listStationRows(database());
  return rows.map((row) => ({
    code: row.code,
    name: row.name,
    fixture: row.fixture,
    link: linkWords(row.link),
    hasController: linkHasController(row.link),
    hasWiperProbe: row.hasWiperProbe,
    printer: row.printer?.name ?? null,
    enrolledBrowsers: row.enrolledBrowsers,
    retiredIso: row.retiredAt?.toISOString() ?? null,
  }));
}

export interface StationSettingsPage {
  form: StationForm;
  binCode: string;
  enrolledBrowsers: number;
  retiredIso: string | null;
}

/** A station as its form shows it; fields of the other kind of link are empty. Null when there is no such station. */
export async function readStationSettings(code: string): Promise<StationSettingsPage | null> {
  const row = (await listStationRows(database())).find((station) => station.code === code);
  if (!row) return null;
  const { link } = row;
  return {
    form: {
      code: row.code,
      name: row.name,
      fixture: row.fixture,
      scheme: row.scheme,
      hasWiperProbe: row.hasWiperProbe,
      printerId: row.printerId,
      mainsHz: row.mainsHz,
      linkKind: link.kind,
      baudRate: link.baudRate,
      hasController: linkHasController(link),
      seed: link.kind === 'simulated' ? link.seed : 0,
      supplyPath: link.kind === 'serial' ? link.supplyPath : '',
      meterPath: link.kind === 'serial' ? link.meterPath : '',
      controllerPath: link.kind === 'serial' ? (link.controllerPath ?? '') : '',
    },
    binCode: row.binCode,
    enrolledBrowsers: row.enrolledBrowsers,
    retiredIso: row.retiredAt?.toISOString() ?? null,
  };
}

export async function stationExists(code: string): Promise<boolean> {
  return (await findStationByCode(database(), code)) !== null;
}

/** Printers that a station may be given. */
export async function listPrinterChoices(): Promise<{ value: string; label: string }[]> {
  const rows = await listPrinters(database());
  return rows.filter((row) => !row.retiredAt).map((row) => ({ value: row.id, label: row.name }));
}
