import { SLOTS, type SlotName } from '../blocks/block.ts';
import { isUsedPart, potentiometerHalves } from '../blocks/settings.ts';
import type { PlacedBlock } from '../blocks/span.ts';
import { formatValue } from '../parts/value-text.ts';
import type { Decibels, Hertz } from '../units.ts';
import { escapeXml } from './escape-xml.ts';

/** A row of the parts list. */
export interface SheetPart {
  readonly designator: string;
  readonly what: string;
  readonly value: string;
  readonly note: string;
}

/** A knob's position on the sheet. */
export interface SheetKnob {
  readonly name: string;
  readonly dial: string;
  readonly what: string;
}

/** A level to be measured on the finished build. */
export interface SheetCheck {
  readonly frequency: Hertz;
  readonly level: Decibels;
}

/** Everything that stands on a build sheet. */
export interface SheetContent {
  readonly title: string;
  readonly author: string;
  readonly revision: string;
  readonly date: string;
  readonly notes: string;
  /** The response as an SVG text, already escaped. */
  readonly plot: string;
  /** What 0 dB is. */
  readonly reference: string;
  readonly figures: readonly { readonly label: string; readonly value: string; readonly note?: string }[];
  readonly parts: readonly SheetPart[];
  readonly knobs: readonly SheetKnob[];
  readonly checks: readonly SheetCheck[];
  /** How the figures came about, in a few lines. */
  readonly method: readonly string[];
}

const SLOT_NAMES: Readonly<Record<SlotName, string>> = {
  input: 'input',
  stage: 'stage',
  volume: 'volume',
  driver: 'driver',
  tone: 'tone network',
  power: 'power stage',
  speaker: 'speaker',
};

/** Parts of a line as they are ordered: block by block in the signal's order, neighbours' figures left out. */
export function sheetParts(placed: readonly PlacedBlock[]): readonly SheetPart[] {
  return [...placed]
    .sort((first, second) => SLOTS.indexOf(first.block.slot) - SLOTS.indexOf(second.block.slot))
    .flatMap(({ block, settings }) =>
      Object.entries(block.parts)
        .filter(([name, part]) => part.kind !== 'quantity' && isUsedPart(block, settings, name))
        .map(([name, part]): SheetPart => {
          const knob = Object.entries(block.knobs).find(([, entry]) => entry.part === name)?.[0];
          const taper = knob === undefined ? undefined : settings.tapers[knob];
          const law =
            taper === undefined
              ? ''
              : taper.law === 'linear'
                ? 'linear'
                : `${taper.law.replace('-', ' ')}, ${Math.round(taper.midpoint * 100)} % at half turn`;
          return {
            designator: part.designator,
            what: `${part.label} (${SLOT_NAMES[block.slot]})`,
            value: formatValue(settings.parts[name]!, part.unit),
            note: law,
          };
        }),
    );
}

/** Knob positions of a line, with the resistances that they are. */
export function sheetKnobs(placed: readonly PlacedBlock[]): readonly SheetKnob[] {
  return placed.flatMap(({ block, settings }) =>
    Object.entries(block.knobs).map(([name, knob]): SheetKnob => {
      const { lower, upper } = potentiometerHalves(block, settings, name);
      return {
        name: knob.label,
        dial: (settings.knobs[name]! * 10).toFixed(1),
        what: `${formatValue(lower, 'Ω')} below the wiper, ${formatValue(upper, 'Ω')} above`,
      };
    }),
  );
}

const CAUTION = [
  'Valve amplifiers hold hundreds of volts, enough to kill, also when they are switched off and unplugged: capacitors keep their charge.',
  'Building, changing or measuring inside one is work for qualified people. Discharge and measure before touching; never work alone.',
  'The electrical code and the licensing rules of the place where you live come first, before anything on this sheet.',
];

const STYLES = `
  @page { margin: 16mm; }
  body { font: 11pt/1.4 'Helvetica Neue', Arial, 'DejaVu Sans', sans-serif; color: #18212b; background: #fff; margin: 0 auto; max-width: 190mm; padding: 8mm; font-variant-numeric: tabular-nums; }
  h1 { font-size: 18pt; margin: 0 0 2mm; } h2 { font-size: 13pt; margin: 8mm 0 2mm; break-after: avoid; }
  .caution { border: 1.5pt solid #9a3412; padding: 3mm 4mm; margin: 4mm 0; color: #7c2d12; }
  .caution strong { display: block; font-size: 12pt; } .caution p { margin: 1mm 0; }
  table { border-collapse: collapse; width: 100%; } th, td { text-align: left; padding: 1.2mm 2mm; border-bottom: 0.5pt solid #d4d9dc; vertical-align: top; }
  thead { display: table-header-group; } tr, figure { break-inside: avoid; } td.number, th.number { text-align: right; white-space: nowrap; }
  figure { margin: 3mm 0; } figure svg { width: 100%; height: auto; } .soft { color: #5a6673; } .notes { white-space: pre-wrap; }
`;

function table(
  headings: readonly string[],
  rows: readonly (readonly string[])[],
  numbers: readonly number[],
): string {
  const cell = (tag: string, text: string, index: number): string =>
    `<${tag}${tag === 'th' ? ' scope="col"' : ''}${numbers.includes(index) ? ' class="number"' : ''}>${escapeXml(text)}</${tag}>`;
  return [
    '<table><thead><tr>',
    ...headings.map((text, index) => cell('th', text, index)),
    '</tr></thead><tbody>',
    ...rows.map((row) => `<tr>${row.map((text, index) => cell('td', text, index)).join('')}</tr>`),
    '</tbody></table>',
  ].join('');
}

const signed = (value: number): string => `${value < 0 ? '−' : ''}${Math.abs(value).toFixed(1)} dB`;

/**
 * The build sheet as one self-contained HTML page for screen and paper: cautions first, then the
 * response, the parts, the settings and what to measure. Everything typed by the user is escaped.
 */
export function buildSheet(content: SheetContent): string {
  const { title, author, revision, date, notes } = content;
  const subtitle = [revision, author, date]
    .filter((text) => text !== '')
    .map(escapeXml)
    .join(' · ');
  return `<!doctype html>
<html lang="en">
<head>
<meta charset="utf-8">
<meta name="viewport" content="width=device-width, initial-scale=1">
<meta http-equiv="Content-Security-Policy" content="default-src 'none'; style-src 'unsafe-inline'">
<title>${escapeXml(title)}: build sheet</title>
<style>${STYLES}</style>
</head>
<body>
<h1>${escapeXml(title)}</h1>
<p class="soft">${subtitle}</p>
<section class="caution" role="note"><strong>Danger: high voltage</strong>
${CAUTION.map((text) => `<p>${text}</p>`).join('\n')}
</section>
${notes === '' ? '' : `<p class="notes">${escapeXml(notes)}</p>`}
<h2>Response</h2>
<figure>${content.plot}<figcaption class="soft">${escapeXml(content.reference)}</figcaption></figure>
${table(
  ['Figure', 'Value', ''],
  content.figures.map(({ label, value, note }) => [label, value, note ?? '']),
  [1],
)}
<h2>Parts</h2>
${
  content.parts.length === 0
    ? '<p>None to buy.</p>'
    : table(
        ['Designator', 'Part', 'Value', ''],
        content.parts.map((part) => [part.designator, part.what, part.value, part.note]),
        [2],
      )
}
${
  content.knobs.length === 0
    ? ''
    : `<h2>Settings</h2>${table(
        ['Knob', 'Dial, 0 to 10', 'That is'],
        content.knobs.map((knob) => [knob.name, knob.dial, knob.what]),
        [1],
      )}`
}
<h2>Bench check</h2>
<p>With the supply off and discharged, and the network out of the amplifier: feed a sine of about 1 V from a generator of the stated source resistance, measure the output with an instrument of high impedance, and compare. Levels are relative to the generator's unloaded output, for parts of exactly the values listed.</p>
${table(
  ['Frequency', 'Expected level'],
  content.checks.map(({ frequency, level }) => [`${frequency} Hz`, signed(level)]),
  [0, 1],
)}
<h2>Method</h2>
${content.method.map((line) => `<p class="soft">${escapeXml(line)}</p>`).join('\n')}
</body>
</html>
`;
}
