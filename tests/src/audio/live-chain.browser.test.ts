import { expect } from '@open-wc/testing';
import { LiveChain } from '../../../src/audio/live-chain.ts';
import { toneSections } from './line-sections.ts';
import { OfflineRig, sine } from './offline-rig.ts';
import { spurious } from './spurious.ts';

describe('turning a knob', () => {
  for (const knob of ['treble', 'bass', 'middle'] as const) {
    it(`${knob}`, async () => {
      const rig = new OfflineRig(2.6);
      const chain = new LiveChain({
        context: rig.context,
        clock: rig.clock,
        destination: rig.context.destination,
      });
      rig.source(sine(220, 2.6)).connect(chain.input);
      chain.setLine({ filters: [{ key: 'tone', sections: toneSections({ [knob]: 0 }) }] });
      for (let step = 0; step <= 120; step += 1) {
        rig.script(0.3 + step / 60, () =>
          chain.setLine({ filters: [{ key: 'tone', sections: toneSections({ [knob]: step / 120 }) }] }),
        );
      }
      const [out] = await rig.render();
      const s = spurious(out!, 48000, 9600, 2.55 * 48000);
      console.log(knob, s.energy, s.peak, Math.max(...out!.map(Math.abs)));
      expect(s.energy).to.be.below(-90);
    });
  }
});
