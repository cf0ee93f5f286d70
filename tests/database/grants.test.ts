import { afterAll, beforeAll, expect, test } from 'vitest';
import { openDatabase } from '@/db/client';
import { postgresErrorOf } from '@/db/errors';
import { migrate } from '@/db/migrate';
import { temporaryDatabase, type TemporaryDatabase } from './temporary-postgres';

let owner: TemporaryDatabase;
beforeAll(async () => {
  owner = await temporaryDatabase();
});
afterAll(() => owner.close());

test('the application role works with the tables but cannot rewrite records or the schema', async () => {
  const password = 'only-for-this-test';
  await owner.pool.query(`create role station_program login password '${password}'`);
  const url = new URL(owner.url);
  url.username = 'station_program';
  url.password = password;
  await migrate(owner.url, url.toString());
  await migrate(owner.url, url.toString());
  const { pool } = openDatabase(url.toString(), 1);
  const codeOf = (text: string) =>
    pool.query(text).then(
      () => null,
      (e: unknown) => postgresErrorOf(e)?.code,
    );
  const refused = '42501';
  try {
    expect(await codeOf(`insert into printers (name, uri) values ('P', 'ipp://127.0.0.1/x')`)).toBeNull();
    expect(await codeOf(`insert into trail (action, entity, entity_id) values ('a', 'b', 'c')`)).toBeNull();
    expect(await codeOf('select * from trail')).toBeNull();
    expect(await codeOf(`update trail set reason = 'x'`)).toBe(refused);
    expect(await codeOf('delete from trail')).toBe(refused);
    expect(await codeOf('delete from runs')).toBe(refused);
    expect(await codeOf('delete from measurements')).toBe(refused);
    expect(await codeOf('truncate runs')).toBe(refused);
    expect(await codeOf('alter table trail disable trigger all')).toBe(refused);
    expect(await codeOf('drop table sessions')).toBe(refused);
  } finally {
    await pool.end();
  }
});
