import { desc, eq } from 'drizzle-orm';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { stations } from '@/db/schema/stations';
import { trail } from '@/db/schema/trail';
import type { Actor } from '@/lib/access/actor';
import { stationSchema, type StationForm } from '@/lib/contracts/station-settings';
import { enrolmentCookie, readEnrolment } from '@/server/auth/enrolment-cookie';
import { enrolBrowser, revokeBrowsers } from '@/server/operations/stations/enrol-browser';
import { listPrinterSettings, retirePrinter, savePrinter } from '@/server/operations/stations/printers';
import { listStationSettings, readStationSettings } from '@/server/operations/stations/read-station-settings';
import { addStation, changeStation, retireStation } from '@/server/operations/stations/save-station';
import { listen } from '@/server/postgres';
import { insertAccount } from './records';
import { temporaryDatabase, type TemporaryDatabase } from './temporary-postgres';

let open: TemporaryDatabase;
let admin: Actor;
beforeAll(async () => {
  open = await temporaryDatabase();
  const account = await insertAccount(open.db, ['administrator']);
  admin = { ...account, accountId: account.id, sessionId: '', sessionKind: 'desk', stationId: null };
});
afterAll(() => open.close());

const form = (over: Partial<StationForm> = {}): StationForm => ({
  code: 's7',
  name: 'Station 7',
  fixture: 'Fixture 7',
  scheme: 'night',
  hasWiperProbe: false,
  printerId: '',
  mainsHz: '60',
  linkKind: 'serial',
  baudRate: '9600',
  hasController: true,
  seed: 0,
  supplyPath: '/dev/ttyS0',
  meterPath: '/dev/ttyS1',
  controllerPath: '',
  ...over,
});

const lastTrail = async () => (await open.db.select().from(trail).orderBy(desc(trail.id)).limit(1))[0]!;

describe('the form of a station', () => {
  test('gives a serial link without controller when its path is empty', () => {
    expect(stationSchema.parse(form())).toMatchObject({
      code: 'S7',
      printerId: null,
      mainsHz: 60,
      link: {
        kind: 'serial',
        supplyPath: '/dev/ttyS0',
        meterPath: '/dev/ttyS1',
        controllerPath: null,
        baudRate: 9600,
      },
    });
  });

  test('gives a simulated link and leaves the paths out', () => {
    const simulated = stationSchema.parse(form({ linkKind: 'simulated', seed: '12', baudRate: 115_200 }));
    expect(simulated.link).toEqual({ kind: 'simulated', seed: 12, baudRate: 115_200, hasController: true });
  });

  test.each([
    ['supplyPath', { supplyPath: '' }],
    ['supplyPath', { supplyPath: 'ttyS0' }],
    ['meterPath', { meterPath: '/dev/ttyS0' }],
    ['code', { code: 'a station' }],
    ['baudRate', { baudRate: '12345' }],
  ])('is refused at %s', (field, over) => {
    const parsed = stationSchema.safeParse(form(over));
    expect(parsed.error?.issues[0]?.path[0]).toBe(field);
  });
});

describe('a station', () => {
  test('is added, changed, retired and returned, each with its trail, and the running one is told', async () => {
    const told: string[] = [];
    const listener = await listen('station_changed', (id) => told.push(id), undefined, open.url);
    try {
      expect(await addStation(admin, stationSchema.parse(form()))).toMatchObject({ ok: true });
      expect(await addStation(admin, stationSchema.parse(form()))).toMatchObject({ code: 'station-exists' });
      expect(await lastTrail()).toMatchObject({ action: 'station.added', accountId: admin.accountId });
      const changed = stationSchema.parse(form({ name: 'Station seven' }));
      expect(await changeStation(admin, changed)).toMatchObject({ ok: true });
      expect(await lastTrail()).toMatchObject({ action: 'station.changed', before: { name: 'Station 7' } });
      const row = await open.db.query.stations.findFirst({ where: eq(stations.code, 'S7') });
      expect(row).toMatchObject({ name: 'Station seven', binCode: 'SWN-S7', link: changed.link });
      await expect.poll(() => told).toEqual([row!.id, row!.id]);
      expect((await readStationSettings('S7'))!.form).toMatchObject({ supplyPath: '/dev/ttyS0', controllerPath: '' });
      await retireStation(admin, { code: 'S7', reason: 'Fixture worn' }, true);
      expect(await lastTrail()).toMatchObject({ action: 'station.retired', reason: 'Fixture worn' });
      expect((await listStationSettings())[0]!.retiredIso).not.toBeNull();
      await retireStation(admin, { code: 'S7', reason: 'New nails' }, false);
      expect((await listStationSettings())[0]!.retiredIso).toBeNull();
    } finally {
      await listener.close();
    }
  });

  test('has browsers enrolled and revoked', async () => {
    const enrolled = await enrolBrowser(admin, 'S7');
    if (!enrolled.ok) throw new Error(enrolled.code);
    const cookies = { [enrolmentCookie]: enrolled.value.token };
    expect(await readEnrolment(cookies)).toMatchObject({ stationCode: 'S7' });
    expect((await listStationSettings())[0]!.enrolledBrowsers).toBe(1);
    expect(JSON.stringify(await lastTrail())).not.toContain(enrolled.value.token);
    expect(await revokeBrowsers(admin, 'S7')).toEqual({ ok: true, value: { revoked: 1 } });
    expect(await readEnrolment(cookies)).toBeNull();
    expect(await enrolBrowser(admin, 'S99')).toMatchObject({ code: 'station-unknown' });
  });
});

describe('a printer', () => {
  test('is kept while a station prints on it', async () => {
    expect(await savePrinter(admin, { printerId: null, name: 'Labels', uri: 'ipp://a.example/ipp' })).toMatchObject({
      ok: true,
    });
    expect(await savePrinter(admin, { printerId: null, name: 'Labels', uri: 'ipp://b.example/ipp' })).toMatchObject({
      code: 'printer-exists',
    });
    const { printerId } = (await listPrinterSettings())[0]!;
    await changeStation(admin, stationSchema.parse(form({ printerId })));
    expect((await listPrinterSettings())[0]).toMatchObject({ stationCodes: ['S7'] });
    expect(await retirePrinter(admin, { printerId })).toMatchObject({ code: 'printer-in-use' });
    await changeStation(admin, stationSchema.parse(form()));
    expect(await retirePrinter(admin, { printerId })).toMatchObject({ ok: true });
    expect((await listPrinterSettings())[0]!.retiredIso).not.toBeNull();
  });
});
