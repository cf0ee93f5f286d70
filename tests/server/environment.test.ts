import { describe, expect, test } from 'vitest';
import { readEnvironment } from '@/server/environment';

const least = {
  DATABASE_URL: 'postgres://program@127.0.0.1:5432/sillwright',
  NEXTAUTH_SECRET: 'thirty-two characters, if not more',
};
const beyond = {
  ...least,
  HOST: '0.0.0.0',
  PUBLIC_URL: 'https://sillwright.plant.example/',
  TRUSTED_PROXY: '1',
};

function read(variables: Record<string, string | undefined>) {
  const given = readEnvironment(variables);
  if (!given.ok) throw new Error(given.sentences.join(' '));
  return given.environment;
}

function sentences(variables: Record<string, string | undefined>): string[] {
  const given = readEnvironment(variables);
  return given.ok ? [] : given.sentences;
}

describe('the environment', () => {
  test('is complete with a database and a secret: loopback, port 3000, no demo, real time', () => {
    expect(read(least)).toMatchObject({
      databaseUrl: least.DATABASE_URL,
      databaseOwnerUrl: least.DATABASE_URL,
      publicUrl: 'http://127.0.0.1:3000',
      loopback: true,
      clockRate: 1,
      demo: false,
    });
  });

  test('takes an empty variable for an absent one', () => {
    expect(read({ ...least, PUBLIC_URL: '', DATABASE_OWNER_URL: '', SILLWRIGHT_DEMO: '' })).toMatchObject({
      publicUrl: 'http://127.0.0.1:3000',
      databaseOwnerUrl: least.DATABASE_URL,
      demo: false,
    });
  });

  test('migrates as the owner where one is given', () => {
    const owner = 'postgres://owner@127.0.0.1:5432/sillwright';
    expect(read({ ...least, DATABASE_OWNER_URL: owner })).toMatchObject({ databaseOwnerUrl: owner });
  });

  test('says in a sentence what is missing or wrong', () => {
    expect(sentences({})).toEqual(['DATABASE_URL is missing.', 'NEXTAUTH_SECRET is missing.']);
    expect(sentences({ ...least, DATABASE_URL: 'mysql://x/y' })).toEqual([
      'DATABASE_URL must be a postgres:// address.',
    ]);
    expect(sentences({ ...least, PORT: 'three' })).toEqual(['PORT must be a number.']);
    expect(sentences({ ...least, NEXTAUTH_SECRET: 'short' })).toEqual([
      'NEXTAUTH_SECRET needs at least 32 characters.',
    ]);
  });
});

describe('beyond loopback', () => {
  test('needs an https address, and drops its last slash', () => {
    expect(read(beyond)).toMatchObject({ publicUrl: 'https://sillwright.plant.example', loopback: false });
    expect(sentences({ ...beyond, PUBLIC_URL: 'http://sillwright.plant.example' })[0]).toContain('https address');
    expect(sentences({ ...beyond, PUBLIC_URL: undefined })[0]).toContain('https address');
  });

  test('needs a certificate of its own or a proxy that it may trust', () => {
    const bare = { ...beyond, TRUSTED_PROXY: undefined };
    expect(sentences(bare)[0]).toContain('TLS_CERTIFICATE_FILE');
    expect(sentences({ ...bare, TLS_CERTIFICATE_FILE: 'c.pem' })[0]).toContain('TLS_KEY_FILE');
    expect(read({ ...bare, TLS_CERTIFICATE_FILE: 'c.pem', TLS_KEY_FILE: 'k.pem' })).toMatchObject({
      tls: { certificateFile: 'c.pem', keyFile: 'k.pem' },
    });
  });

  test('refuses the demo', () => {
    expect(sentences({ ...beyond, SILLWRIGHT_DEMO: '1' })[0]).toContain('demo accounts');
  });
});
