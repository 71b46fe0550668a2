import { expect } from '@open-wc/testing';
import { rasterise } from '../../../components/chart/rasterise.ts';
import { plotSvg } from '../../../src/sheet/plot-svg.ts';
import { sampleCurves } from './sample-curves.ts';

/** The pixels of a PNG, read by the browser's own decoder. */
async function pixels(blob: Blob): Promise<ImageData> {
  const bitmap = await createImageBitmap(blob);
  const context = new OffscreenCanvas(bitmap.width, bitmap.height).getContext('2d')!;
  context.drawImage(bitmap, 0, 0);
  return context.getImageData(0, 0, bitmap.width, bitmap.height);
}

describe('an SVG as a PNG', () => {
  it('has the size asked for and shows what is drawn', async () => {
    const red =
      '<svg xmlns="http://www.w3.org/2000/svg" width="30" height="20"><rect width="15" height="20" fill="#ff0000"/></svg>';
    const blob = await rasterise(red, 2);
    expect(blob.type).to.equal('image/png');
    const { width, height, data } = await pixels(blob);
    expect([width, height]).to.deep.equal([60, 40]);
    expect([...data.slice(0, 4)]).to.deep.equal([255, 0, 0, 255]);
    expect(data[4 * 59 + 3]).to.equal(0); // nothing at the right
  });

  it('holds a plot on white, with its curves', async () => {
    const svg = plotSvg(sampleCurves(), { title: 'Attic amplifier', quantity: 'magnitude' });
    const { width, data } = await pixels(await rasterise(svg, 2));
    expect(width).to.equal(1600);
    expect([...data.slice(0, 4)]).to.deep.equal([255, 255, 255, 255]);
    let blue = 0; // the first voicing's colour, #0072b2
    for (let index = 0; index < data.length; index += 4) {
      if (data[index] === 0x00 && data[index + 1] === 0x72 && data[index + 2] === 0xb2) blue += 1;
    }
    expect(blue).to.be.greaterThan(1000);
  });

  it('refuses what is no picture', async () => {
    let refused = false;
    try {
      await rasterise('this is no SVG', 1);
    } catch {
      refused = true;
    }
    expect(refused).to.equal(true);
  });
});
