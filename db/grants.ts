import { escapeIdentifier, type ClientBase } from 'pg';

/** Tables that the program only adds to, so that even a fault in it cannot rewrite them. */
const addedToOnly = ['trail', 'lot_moves', 'signatures', 'hold_rule_sets', 'chart_baselines'];
/** Records that are written and finished but never removed. */
const neverRemoved = [
  'accounts',
  'runs',
  'run_events',
  'traces',
  'measurements',
  'dispositions',
  'retest_orders',
  'units',
  'lots',
  'engineering_offers',
  'lot_holds',
  'certificates',
];

/** Gives the application's role its rights on the tables of the owner who is connected. Repeating it changes nothing. */
export async function grantApplication(owner: ClientBase, role: string): Promise<void> {
  const name = escapeIdentifier(role);
  await owner.query(`grant usage on schema public to ${name}`);
  await owner.query(`grant select, insert, update, delete on all tables in schema public to ${name}`);
  await owner.query(`grant usage on all sequences in schema public to ${name}`);
  await owner.query(`revoke delete on ${neverRemoved.join(', ')} from ${name}`);
  await owner.query(`revoke update, delete on ${addedToOnly.join(', ')} from ${name}`);
}
