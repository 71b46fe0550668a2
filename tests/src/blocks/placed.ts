import type { Block, BlockSettings } from '../../../src/blocks/block.ts';
import { defaultSettings } from '../../../src/blocks/settings.ts';
import { type PlacedBlock, type SpanTransfer, spansOf, spanTransfer } from '../../../src/blocks/span.ts';
import { LINEAR, type Taper } from '../../../src/parts/taper.ts';
import { rotation } from '../../../src/units.ts';

/** What a case sets apart from a new block's settings; knobs are then on linear tapers unless it says. */
export interface Setting {
  readonly parts?: Readonly<Record<string, number>>;
  readonly knobs?: Readonly<Record<string, number>>;
  readonly taper?: Taper;
  readonly choices?: Readonly<Record<string, string>>;
}

/** A block with the settings of one case; an unknown name in them is an error. */
export function placed(block: Block, setting: Setting = {}): PlacedBlock {
  const settings = defaultSettings(block);
  for (const field of ['parts', 'knobs', 'choices'] as const) {
    for (const name of Object.keys(setting[field] ?? {})) {
      if (!(name in settings[field])) throw new Error(`${block.variant} has no ${name} among its ${field}`);
    }
  }
  const turned = Object.entries(setting.knobs ?? {}).map(([name, turn]) => [name, rotation(turn)] as const);
  const tapers: BlockSettings['tapers'] = Object.fromEntries(
    turned.map(([name]) => [name, setting.taper ?? LINEAR]),
  );
  return {
    block,
    settings: {
      ...settings,
      parts: { ...settings.parts, ...setting.parts },
      knobs: { ...settings.knobs, ...Object.fromEntries(turned) },
      tapers: { ...settings.tapers, ...tapers },
      choices: { ...settings.choices, ...setting.choices },
    },
  };
}

/** The one span that these blocks make. */
export function oneSpan(...blocks: readonly PlacedBlock[]): SpanTransfer {
  const [span, ...others] = spansOf(blocks);
  if (span === undefined || others.length > 0) throw new Error('the blocks are not one span');
  return spanTransfer(span);
}
