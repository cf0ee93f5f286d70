/** Says what is going on while the start command works; one line a step, with the seconds it took. */
export async function step(title, work) {
  const began = performance.now();
  process.stdout.write(`  ${title} …\n`);
  const result = await work();
  process.stdout.write(`  ${title}: ${((performance.now() - began) / 1000).toFixed(1)} s\n`);
  return result;
}

/** Ends the command with a sentence that says what to do. */
export function giveUp(sentence) {
  process.stderr.write(`\n${sentence}\n`);
  process.exit(1);
}
