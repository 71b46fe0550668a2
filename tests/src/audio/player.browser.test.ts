import { expect } from '@open-wc/testing';
import { Player } from '../../../src/audio/player.ts';
import { prepareBuffer } from '../../../src/audio/prepare-buffer.ts';
import { NotchworkError } from '../../../src/errors.ts';
import { OfflineRig, sine } from './offline-rig.ts';
import { spurious } from './spurious.ts';

const RATE = 48_000;
const frame = (seconds: number): number => Math.round(seconds * RATE);

interface Bench {
  readonly rig: OfflineRig;
  readonly player: Player;
  readonly ended: () => number;
}

/** A player with a clip in it, in an offline rendering. */
async function makeBench(seconds: number, clip: Float32Array): Promise<Bench> {
  const rig = new OfflineRig(seconds, RATE);
  let ended = 0;
  const player = new Player({
    tone: rig.tone,
    clock: rig.clock,
    target: rig.context.destination,
    onEnded: () => {
      ended += 1;
    },
  });
  const { buffer } = await prepareBuffer(rig.context, {
    sampleRate: RATE,
    channels: [clip],
    frames: clip.length,
  });
  player.load(buffer);
  return { rig, player, ended: () => ended };
}

/** Steps of 1/1000 each: every sample tells where in the clip it comes from. */
function ramp(seconds: number): Float32Array {
  return Float32Array.from({ length: frame(seconds) }, (_, index) => (index + 1) / 2 ** 20);
}

describe('playing', () => {
  it('starts 20 ms ahead and plays the samples of the clip, each as it is', async () => {
    const clip = ramp(0.5);
    const { rig, player } = await makeBench(0.4, clip);
    player.setLoop(false);
    player.play();
    const [output] = await rig.render();
    const start = frame(0.02);
    expect(output!.subarray(0, start).every((value) => value === 0)).to.equal(true);
    for (let index = frame(0.01); index < frame(0.3); index += 1) {
      expect(output![start + index]).to.equal(clip[index]);
    }
  });

  it('starts not before the time it is given', async () => {
    const { rig, player } = await makeBench(0.4, ramp(0.5));
    player.play(0.2);
    const [output] = await rig.render();
    expect(output!.subarray(0, frame(0.2)).every((value) => value === 0)).to.equal(true);
    expect(output![frame(0.3)]).to.equal(ramp(0.5)[frame(0.1)]);
  });

  it('needs a clip', async () => {
    const { player } = await makeBench(0.1, ramp(0.1));
    player.load(undefined);
    expect(() => player.play()).to.throw(NotchworkError, 'no clip');
  });

  it('does not click at start, stop, jump, change of loop and end, over a 220 Hz tone', async () => {
    // A cosine: it starts and stops at its very top if nobody sees to it.
    const clip = Float32Array.from(
      { length: frame(1.003) },
      (_, index) => Math.cos((2 * Math.PI * 220 * index) / RATE) / 2,
    );
    const { rig, player, ended } = await makeBench(4, clip);
    rig.script(0.1, () => player.play());
    rig.script(0.3, () => player.stop());
    rig.script(0.5, () => player.play());
    rig.script(0.61, () => player.seek(0.2005));
    rig.script(1.7, () => player.setRegion({ start: 0.3333, end: 0.7011 }));
    rig.script(2.6, () => player.setLoop(false));
    const [output] = await rig.render();
    const { energy } = spurious(output!, RATE);
    expect(ended()).to.equal(1);
    // Asked for: −90 dB, over a dozen starts, stops and seams of 5 ms.
    expect(energy).to.be.below(-90);
  });

  it('stops and starts at once without a click, also in the middle of its fades', async () => {
    const { rig, player } = await makeBench(1.5, sine(220, 1.2));
    rig.script(0.1, () => {
      player.play();
      player.stop();
      player.play();
    });
    for (let step = 0; step < 40; step += 1) {
      rig.script(0.3 + step * 0.004, () => (player.playing ? player.stop() : player.play()));
    }
    rig.script(0.6, () => player.play());
    const [output] = await rig.render();
    // It still plays at the end of the rendering, which is no click of the player's.
    expect(spurious(output!, RATE, 0, frame(1.45)).energy).to.be.below(-90);
    // Two fades that overlap add up to 1 at the most.
    expect(output!.reduce((most, value) => Math.max(most, value), 0)).to.be.at.most(0.5);
    expect(player.playing).to.equal(true);
  });
});

describe('a loop', () => {
  it('is exact to the sample over many turns', async () => {
    const clip = ramp(0.5);
    const { rig, player } = await makeBench(1.5, clip);
    player.setRegion({ start: 0.1, end: 0.2 });
    player.play();
    const [output] = await rig.render();
    const start = frame(0.02);
    for (let index = frame(0.01); index < frame(1.4); index += 1) {
      const place = index % frame(0.1);
      // The last 5 ms are the seam; the rest is the clip itself.
      if (place < frame(0.095)) expect(output![start + index]).to.equal(clip[frame(0.1) + place]);
    }
  });

  it('has a seam without a click, though the tone does not fit the region', async () => {
    const { rig, player } = await makeBench(2, sine(220, 1));
    player.setRegion({ start: 0.1, end: 0.3517 });
    player.play();
    const [output] = await rig.render();
    expect(spurious(output!, RATE, frame(0.05), frame(1.95)).energy).to.be.below(-90);
  });

  it('goes on where it is when the region grows: no gap and no jump', async () => {
    const clip = ramp(1);
    const { rig, player } = await makeBench(0.7, clip);
    player.setRegion({ start: 0.1, end: 0.5 });
    player.play();
    rig.script(0.2, () => player.setRegion({ start: 0.1, end: 0.9 }));
    const [output] = await rig.render();
    for (let index = frame(0.01); index < frame(0.6); index += 1) {
      // Between two voices that play the same sample, an equal-gain fade changes nothing but roundings.
      expect(output![frame(0.02) + index]).to.be.closeTo(clip[frame(0.1) + index]!, 2 ** -23);
    }
  });

  it('off: plays to the end of the region once, says so, and is ready to start over', async () => {
    const { rig, player, ended } = await makeBench(0.6, ramp(0.5));
    player.setLoop(false);
    player.setRegion({ start: 0.1, end: 0.3 });
    player.play();
    rig.script(0.4, () => {
      expect(ended()).to.equal(1);
      expect(player.playing).to.equal(false);
      expect(player.position()).to.be.closeTo(0.1, 1e-9);
    });
    const [output] = await rig.render();
    expect(ended()).to.equal(1);
    expect(output![frame(0.02 + 0.19)]).to.equal(ramp(0.5)[frame(0.29)]);
    expect(output!.subarray(frame(0.2205)).every((value) => value === 0)).to.equal(true);
  });
});

describe('the place in the clip', () => {
  it('follows the sound, through the turns of a loop, and stays where it was stopped', async () => {
    const { rig, player } = await makeBench(1, ramp(0.5));
    player.setRegion({ start: 0.1, end: 0.3 });
    player.play();
    const places: [number, number][] = [];
    for (const time of [0.1, 0.3, 0.5])
      rig.script(time, () => places.push([rig.clock.now, player.position()]));
    rig.script(0.6, () => player.stop());
    rig.script(0.8, () => places.push([0.6, player.position()]));
    await rig.render();
    for (const [time, place] of places) {
      // Started at 0.02 s, from 0.1 s, turning every 0.2 s; halts lie on blocks of 2.7 ms.
      expect(place).to.be.closeTo(0.1 + ((time - 0.02) % 0.2), 0.003);
    }
  });

  it('can be set while stopped and while playing, and is held inside the region', async () => {
    const { rig, player } = await makeBench(0.4, ramp(0.5));
    player.seek(0.25);
    expect(player.position()).to.equal(0.25);
    player.setRegion({ start: 0.3, end: 0.45 });
    expect(player.position()).to.be.closeTo(0.3, 1e-9);
    player.seek(9);
    expect(player.position()).to.be.closeTo(0.3, 1e-9);
    player.seek(Number.NaN);
    expect(player.position()).to.be.closeTo(0.3, 1e-9);
    player.play();
    rig.script(0.1, () => player.seek(0.4));
    rig.script(0.2, () => expect(player.position()).to.be.within(0.46 - 0.15, 0.5));
    await rig.render();
  });
});

describe('a region that cannot be played', () => {
  const regions: [string, number, number][] = [
    ['of length 0', 0.2, 0.2],
    ['backwards', 0.3, 0.1],
    ['shorter than 20 ms', 0.1, 0.115],
    ['behind the end of the clip', 2, 3],
    ['not a number', Number.NaN, 0.3],
  ];
  for (const [name, start, end] of regions) {
    it(`is refused, and the one before stays: ${name}`, async () => {
      const { player } = await makeBench(0.1, ramp(0.5));
      player.setRegion({ start: 0.1, end: 0.3 });
      expect(() => player.setRegion({ start, end })).to.throw(NotchworkError, 'too short to play');
      player.seek(0.2);
      expect(player.position()).to.equal(0.2);
      player.seek(0.4);
      expect(player.position()).to.be.closeTo(0.1, 1e-9);
    });
  }
});
