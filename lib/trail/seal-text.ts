/** An entry as it is sealed: every value as PostgreSQL writes it, null where there is none. */
export interface SealedFields {
  chain: string;
  place: number;
  /** UTC with microseconds: 2026-12-01T09:30:00.123456Z. */
  at: string;
  accountId: string | null;
  stationId: string | null;
  action: string;
  entity: string;
  entityId: string;
  before: string | null;
  after: string | null;
  reason: string | null;
}

const bytes = new TextEncoder();

/**
 * The text whose SHA-256 (UTF-8, hexadecimal) is an entry's seal. A first line names the format; then each field stands on a line
 * of its own as its length in bytes, a colon and itself, or as a hyphen where it is null, so that no two entries share a text. The
 * same as `seal_of` in the database, which this checks. `before`: seal of the entry one place earlier; null for the first.
 */
export function sealText(before: string | null, entry: SealedFields): string {
  const fields = [
    before,
    entry.chain,
    String(entry.place),
    entry.at,
    entry.accountId,
    entry.stationId,
    entry.action,
    entry.entity,
    entry.entityId,
    entry.before,
    entry.after,
    entry.reason,
  ];
  return 'sillwright trail 1\n' + fields.map(sealField).join('');
}

function sealField(value: string | null): string {
  return (value === null ? '-' : `${bytes.encode(value).length}:${value}`) + '\n';
}
