import { expect } from '@open-wc/testing';
import { spokenTime, timeText } from '../../../components/nw-waveform/clip-time.ts';

describe('times in a clip', () => {
  it('are written in minutes and tenths of a second', () => {
    expect([0, 3.14, 9.96, 59.96, 61, 1200].map(timeText)).to.deep.equal([
      '0:00.0',
      '0:03.1',
      '0:10.0',
      '1:00.0',
      '1:01.0',
      '20:00.0',
    ]);
  });

  it('are spoken in words', () => {
    expect([0, 1, 3.14, 60, 64.2, 1200].map(spokenTime)).to.deep.equal([
      '0 seconds',
      '1 second',
      '3.1 seconds',
      '1 minute 0 seconds',
      '1 minute 4.2 seconds',
      '20 minutes 0 seconds',
    ]);
  });

  it('are 0 where there is none', () => {
    expect([timeText(Number.NaN), timeText(-1), spokenTime(Number.POSITIVE_INFINITY)]).to.deep.equal([
      '0:00.0',
      '0:00.0',
      '0 seconds',
    ]);
  });
});
