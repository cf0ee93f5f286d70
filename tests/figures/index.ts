import { figures } from './figures';
import { formatTable } from './table';

const [, , name, shareText = '1'] = process.argv;
const share = Number(shareText);
const figure = figures.find((each) => each.name === name);
if (!figure || !(share > 0 && share <= 1)) {
  if (name && !figure) console.error(`There is no figure "${name}".`);
  console.log('Figures: npm run figures -- NAME [SHARE of the boards, 1 unless given]');
  for (const each of figures) console.log(`  ${each.name.padEnd(12)} ${each.title}`);
  process.exit(name ? 1 : 0);
}

const startedAt = performance.now();
const elapsed = () => `${((performance.now() - startedAt) / 1000).toFixed(0).padStart(5)} s`;
console.log(`${figure.name}: ${figure.title}`);
const { rows, targets, notes } = await figure.run((line) => console.log(`${elapsed()}  ${line}`), share);
if (share < 1) notes.push(`Only ${share} of the boards: not the figure.`);
console.log(`\n${formatTable(rows)}\n`);
for (const note of notes) console.log(note);
console.log('');
for (const { name: what, value, limit, met } of targets)
  console.log(`${met ? 'met   ' : 'MISSED'}  ${what}: ${value} (limit ${limit})`);
console.log(`${elapsed()}\n`);
console.log(JSON.stringify({ figure: figure.name, rows, targets }));
process.exit(targets.every((target) => target.met) ? 0 : 1);
