import { writeFileSync } from 'node:fs';
import { RATE, TAKES } from './takes.mjs';

/** `npm run demo-audio`: computes the demo clips and writes them beside this script. */
function wav(steps) {
  const bytes = Buffer.alloc(44 + 2 * steps.length);
  bytes.write('RIFF', 0);
  bytes.writeUInt32LE(bytes.length - 8, 4);
  bytes.write('WAVEfmt ', 8);
  bytes.writeUInt32LE(16, 16);
  bytes.writeUInt16LE(1, 20);
  bytes.writeUInt16LE(1, 22);
  bytes.writeUInt32LE(RATE, 24);
  bytes.writeUInt32LE(2 * RATE, 28);
  bytes.writeUInt16LE(2, 32);
  bytes.writeUInt16LE(16, 34);
  bytes.write('data', 36);
  bytes.writeUInt32LE(2 * steps.length, 40);
  for (const [index, step] of steps.entries()) bytes.writeInt16LE(step, 44 + 2 * index);
  return bytes;
}

for (const { file, make } of TAKES) {
  const steps = make();
  writeFileSync(new URL(file, import.meta.url), wav(steps));
  process.stdout.write(`${file}: ${(steps.length / RATE).toFixed(1)} s\n`);
}
