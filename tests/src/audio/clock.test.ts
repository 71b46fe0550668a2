import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { contextClock } from '../../../src/audio/clock.ts';
import { Scope } from '../../../src/audio/scope.ts';

/** A context whose time the test sets. */
const fakeContext = () => ({ currentTime: 0, state: 'running' });

describe('contextClock', () => {
  beforeEach(() => {
    vi.useFakeTimers();
  });
  afterEach(() => {
    vi.useRealTimers();
  });

  function make() {
    const context = fakeContext();
    const scope = new Scope();
    return { context, scope, clock: contextClock(context as BaseAudioContext, scope) };
  }

  it('tells the time of the context and whether it passes', () => {
    const { context, clock } = make();
    context.currentTime = 3;
    expect(clock.now).toBe(3);
    expect(clock.running).toBe(true);
    context.state = 'interrupted';
    expect(clock.running).toBe(false);
  });

  it('acts once the time is reached, not before, however late the context is', () => {
    const { context, clock, scope } = make();
    const action = vi.fn();
    clock.at(0.1, action);
    vi.advanceTimersByTime(200);
    expect(action).not.toHaveBeenCalled();
    context.currentTime = 0.1;
    vi.advanceTimersByTime(200);
    vi.advanceTimersByTime(200);
    expect(action).toHaveBeenCalledTimes(1);
    expect(scope.size).toBe(0);
  });

  it('waits through a suspension, looking only now and then', () => {
    const { context, clock } = make();
    const action = vi.fn();
    clock.at(0.01, action);
    context.state = 'suspended';
    vi.advanceTimersByTime(10_000);
    expect(vi.getTimerCount()).toBe(1);
    expect(action).not.toHaveBeenCalled();
    context.state = 'running';
    context.currentTime = 1;
    vi.advanceTimersByTime(300);
    expect(action).toHaveBeenCalledTimes(1);
  });

  it('is called off, by hand or with its scope', () => {
    const { context, clock, scope } = make();
    const action = vi.fn();
    const callOff = clock.at(0.1, action);
    // Set again meanwhile: the newest timer is the one to call off.
    vi.advanceTimersByTime(150);
    callOff();
    clock.at(0.1, action);
    scope.dispose();
    context.currentTime = 1;
    vi.advanceTimersByTime(10_000);
    expect(action).not.toHaveBeenCalled();
    expect(vi.getTimerCount()).toBe(0);
  });
});
