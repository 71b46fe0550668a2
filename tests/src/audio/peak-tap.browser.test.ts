import { expect } from '@open-wc/testing';
import { PeakTap } from '../../../src/audio/peak-tap.ts';
import { OfflineRig } from './offline-rig.ts';

describe('PeakTap', () => {
  it('sees a single sample in either channel once, and nothing of it in the next reading', async () => {
    const rig = new OfflineRig(0.6);
    const left = new Float32Array(28_800);
    const right = new Float32Array(28_800);
    left[4800 * 1 + 2000] = 0.5;
    right[4800 * 3 + 2000] = -0.75;
    const source = rig.source(left, right);
    source.connect(rig.context.destination);
    const tap = new PeakTap(rig.context, source);
    const peaks: number[] = [];
    for (let step = 1; step <= 5; step += 1) rig.script(step * 0.1, () => peaks.push(tap.read().peak));
    await rig.render();
    expect(peaks).to.deep.equal([0, 0.5, 0, 0.75, 0]);
  });

  it('says how much time has passed, and finds nothing while none has', async () => {
    const rig = new OfflineRig(0.3);
    const source = rig.source(new Float32Array(14_400).fill(0.5));
    source.connect(rig.context.destination);
    const tap = new PeakTap(rig.context, source);
    rig.script(0.1, () => {
      expect(tap.read().elapsed).to.be.closeTo(0.1, 0.003);
      expect(tap.read()).to.deep.equal({ peak: 0, elapsed: 0 });
    });
    await rig.render();
    expect(tap.read().peak).to.equal(0.5);
    tap.dispose();
  });
});
