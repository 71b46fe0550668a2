import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import Papa from 'papaparse';
import { afterAll, afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { main } from '../../../src/cli/main.ts';
import { measureLoudness } from '../../../src/clip/loudness.ts';
import { readWav } from '../../../src/clip/wav-reader.ts';
import { defaultDesign } from '../../../src/design/design.ts';
import { writeDesign } from '../../../src/design/read-design.ts';
import { writeWav } from '../../../src/sheet/wav.ts';
import { lineResponseByHand, renderByHand } from '../../e2e/independent-line.ts';
import { joined, sine, whiteNoise } from '../clip/signals.ts';

const folder = mkdtempSync(join(tmpdir(), 'notchwork-cli-'));
afterAll(() => rmSync(folder, { recursive: true, force: true }));

function file(name: string, content: string | Uint8Array): string {
  const path = join(folder, name);
  writeFileSync(path, content);
  return path;
}

let out = '';
let err = '';
beforeEach(() => {
  out = '';
  err = '';
  vi.spyOn(process.stdout, 'write').mockImplementation((text) => {
    out += text;
    return true;
  });
  vi.spyOn(process.stderr, 'write').mockImplementation((text) => {
    err += text;
    return true;
  });
});
afterEach(() => {
  vi.restoreAllMocks();
});

const LOW_PASS = file(
  'low-pass.cir',
  'low pass\nV1 in 0 AC 1\n.param turn=1\nR1 in out {10k*turn}\nC1 out 0 10n\nR2 in mid 1k\nR3 mid 0 1k\n.end\n',
);
const DESIGN = file('design.json', writeDesign(defaultDesign()));

function rows(): Record<string, number>[] {
  return Papa.parse<Record<string, string>>(out.trimEnd(), { header: true }).data.map((row) =>
    Object.fromEntries(
      Object.entries(row).map(([name, text]) => [name, text === '' ? Number.NaN : Number(text)]),
    ),
  );
}

describe('curve', () => {
  it('gives the one-pole low pass of any textbook: −3.01 dB and −45° at 1/(2πRC)', async () => {
    const corner = 1 / (2 * Math.PI * 10e3 * 10e-9);
    expect(await main(['curve', LOW_PASS, '--at', `${corner},${corner * 10}`])).toBe(0);
    expect(out.split('\n')[0]).toBe('frequency_hz,magnitude_db,phase_deg');
    const [first, second] = rows();
    expect(first!['magnitude_db']).toBeCloseTo(-10 * Math.log10(2), 12);
    expect(first!['phase_deg']).toBeCloseTo(-45, 12);
    expect(second!['magnitude_db']).toBeCloseTo(-10 * Math.log10(101), 12);
  });

  it('sets knobs, reads other nodes, takes ranges', async () => {
    expect(await main(['curve', LOW_PASS, '--knob', 'turn=0', '--at', '10000'])).toBe(0);
    expect(rows()[0]!['magnitude_db']).toBeCloseTo(0, 12);
    out = '';
    expect(
      await main([
        'curve',
        LOW_PASS,
        '--output',
        'mid',
        '--from',
        '100',
        '--to',
        '1000',
        '--per-decade',
        '2',
      ]),
    ).toBe(0);
    expect(rows().map((row) => Math.round(row['frequency_hz']!))).toEqual([100, 316, 1000]);
    for (const row of rows()) expect(row['magnitude_db']).toBeCloseTo(20 * Math.log10(0.5), 12);
  });

  it('adds the digital filter at a rate, empty above half of it', async () => {
    expect(await main(['curve', LOW_PASS, '--sample-rate', '48000', '--at', '1000,30000'])).toBe(0);
    const [low, high] = rows();
    const warped = (48_000 / Math.PI) * Math.tan((Math.PI * 1000) / 48_000);
    expect(low!['digital_magnitude_db']).toBeCloseTo(
      -10 * Math.log10(1 + (2 * Math.PI * warped * 1e-4) ** 2),
      9,
    );
    expect(high!['digital_magnitude_db']).toBeNaN();
  });

  it('of a design agrees with the circuit written down by hand', async () => {
    expect(
      await main([
        'curve',
        DESIGN,
        '--knob',
        'presence=0.9',
        '--knob',
        'tone.treble=0.2',
        '--at',
        '50,700,8000',
      ]),
    ).toBe(0);
    for (const row of rows()) {
      const { re, im } = lineResponseByHand(
        { treble: 0.2, trebleCap: 390e-12, presence: 0.9 },
        2 * Math.PI * row['frequency_hz']!,
      );
      expect(row['magnitude_db']).toBeCloseTo(20 * Math.log10(Math.hypot(re, im)), 9);
    }
  });
});

describe('coefficients', () => {
  it('are in ascending powers of s, with sections when a rate is given', async () => {
    expect(await main(['coefficients', LOW_PASS, '--sample-rate', '96000'])).toBe(0);
    const answer = JSON.parse(out);
    expect(answer.denominator[1] / answer.denominator[0]).toBeCloseTo(1e-4, 15);
    expect(answer.numerator[0]).toBe(answer.denominator[0]);
    expect(answer.sections).toHaveLength(1);
    expect(answer.sections[0].feedback[0]).toBe(1);
    const pole = -answer.sections[0].feedback[1];
    expect(pole).toBeCloseTo((2 * 96_000 * 1e-4 - 1) / (2 * 96_000 * 1e-4 + 1), 12);
  });
});

describe('render', () => {
  it('agrees with the frequency-domain computation by hand, keeps rate and channels, is never shorter', async () => {
    const clip = { ...whiteNoise(4, 0.2, 44_100), sampleRate: 44_100 };
    const input = file(
      'in.wav',
      writeWav({ ...clip, channels: [clip.channels[0]!, clip.channels[0]!.map((value) => -value / 2)] }, 32),
    );
    expect(await main(['render', DESIGN, input, join(folder, 'out.wav'), '--knob', 'treble=1'])).toBe(0);
    const rendered = readWav(readFileSync(join(folder, 'out.wav')));
    expect([rendered.sampleRate, rendered.channels.length]).toEqual([44_100, 2]);
    expect(rendered.frames).toBeGreaterThanOrEqual(clip.frames);
    const expected = renderByHand(clip.channels[0]!, 44_100, {
      treble: 1,
      trebleCap: 390e-12,
      presence: 0.4,
    });
    for (const [index, value] of expected.entries()) {
      expect(Math.abs(rendered.channels[0]![index]! - value)).toBeLessThan(1e-6);
      expect(Math.abs(rendered.channels[1]![index]! + value / 2)).toBeLessThan(1e-6);
    }
  });

  it('is as loud as the clip when matched', async () => {
    const clip = joined([sine(220, -12, 1.5), sine(2200, -20, 1.5)]);
    const input = file('tones.wav', writeWav(clip, 24));
    expect(
      await main(['render', DESIGN, input, join(folder, 'matched.wav'), '--matched', '--bits', '24']),
    ).toBe(0);
    const rendered = readWav(readFileSync(join(folder, 'matched.wav')));
    const [before, after] = [measureLoudness(clip), measureLoudness(rendered)];
    if (before.kind !== 'measured' || after.kind !== 'measured') throw new Error('no loudness');
    expect(Math.abs(before.lufs - after.lufs)).toBeLessThan(0.1);
  });
});

describe('sheet', () => {
  it('is one page that holds cautions, curve, parts and checks, of a design and of a netlist', async () => {
    for (const [input, part] of [
      [DESIGN, '390\u202fpF'],
      [LOW_PASS, '10\u202fnF'],
    ] as const) {
      const path = join(folder, 'sheet.html');
      expect(await main(['sheet', input, path])).toBe(0);
      const text = readFileSync(path, 'utf8');
      expect(text).toMatch(/Danger: high voltage[\s\S]*electrical code/);
      expect(text).toContain('<svg');
      expect(text).toContain(part);
      expect(text).toContain('16000 Hz');
      expect(text).not.toMatch(/(src|href)="https?:/);
    }
  });

  it('escapes what was typed', async () => {
    const path = file(
      'hostile.json',
      writeDesign({
        ...defaultDesign(),
        title: '<script>alert(1)</script>',
        notes: '"><img src=x onerror=alert(1)>',
      }),
    );
    expect(await main(['sheet', path, join(folder, 'hostile.html')])).toBe(0);
    expect(readFileSync(join(folder, 'hostile.html'), 'utf8')).not.toMatch(/<script>|<img/);
  });
});

describe('what is wrong', () => {
  it.each([
    [['curve'], 2, /Expected FILE/],
    [[], 2, /No command/],
    [['dance', LOW_PASS], 2, /There is no command “dance”/],
    [['curve', LOW_PASS, '--knob', 'turn'], 2, /NAME=POSITION/],
    [['curve', LOW_PASS, '--knob', 'turn=2'], 2, /0 to 1/],
    [['curve', LOW_PASS, '--knob', 'gain=0.5'], 2, /no knob “gain”.*turn/],
    [['curve', DESIGN, '--knob', 'gain=0.5'], 2, /no knob.*tone\.treble/],
    [['curve', LOW_PASS, '--at', 'often'], 2, /--at is “often”/],
    [['curve', LOW_PASS, '--frequency', '1'], 2, /frequency/],
    [['curve', 'design.txt'], 2, /neither \.json/],
    [['render', LOW_PASS, 'a.wav', 'b.wav', '--bits', '16'], 2, /24 or 32/],
    [['curve', LOW_PASS, '--output', 'nowhere'], 1, /low-pass\.cir.*nowhere.*out/],
    [['curve', join(folder, 'missing.cir')], 1, /missing\.cir: cannot be read/],
    [['curve', file('broken.json', '{')], 1, /broken\.json: .*not JSON/],
    [
      ['curve', file('broken.cir', 'x\nV1 in 0 AC 1\nR1 in out 4q7z\n.end')],
      1,
      /broken\.cir: line 3, column/,
    ],
    [['render', LOW_PASS, file('text.wav', 'no sound'), 'b.wav'], 1, /text\.wav: .*WAV/],
  ] as const)('%j', async (args, code, message) => {
    expect(await main(args)).toBe(code);
    expect(err).toMatch(message);
    expect(out).toBe('');
  });

  it('helps when asked', async () => {
    expect(await main(['--help'])).toBe(0);
    for (const name of ['curve', 'coefficients', 'render', 'sheet']) expect(out).toContain(name);
    for (const name of ['curve', 'coefficients', 'render', 'sheet']) {
      out = '';
      expect(await main([name, '--help'])).toBe(0);
      expect(out).toMatch(/Usage: npm run/);
    }
  });
});
