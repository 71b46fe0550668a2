import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest';
import { Scope } from '../../../src/audio/scope.ts';

describe('Scope', () => {
  beforeEach(() => {
    vi.useFakeTimers();
  });
  afterEach(() => {
    vi.useRealTimers();
  });

  it('releases everything once, newest first', () => {
    const scope = new Scope();
    const released: string[] = [];
    scope.add(() => released.push('first'));
    scope.add(() => released.push('second'));
    expect(scope.size).toBe(2);
    scope.dispose();
    scope.dispose();
    expect(released).toEqual(['second', 'first']);
    expect(scope.size).toBe(0);
    expect(scope.disposed).toBe(true);
  });

  it('releases one thing early, and not again at the end', () => {
    const scope = new Scope();
    const release = vi.fn();
    const early = scope.add(release);
    early();
    early();
    scope.dispose();
    expect(release).toHaveBeenCalledTimes(1);
  });

  it('releases at once what comes after disposal', () => {
    const scope = new Scope();
    scope.dispose();
    const release = vi.fn();
    scope.add(release);
    expect(release).toHaveBeenCalledTimes(1);
    expect(scope.size).toBe(0);
  });

  it('listens until disposal', () => {
    const scope = new Scope();
    const target = new EventTarget();
    const handler = vi.fn();
    scope.listen(target, 'change', handler);
    target.dispatchEvent(new Event('change'));
    scope.dispose();
    target.dispatchEvent(new Event('change'));
    expect(handler).toHaveBeenCalledTimes(1);
  });

  it('runs a timer once and forgets it', () => {
    const scope = new Scope();
    const action = vi.fn();
    scope.timeout(action, 10);
    expect(scope.size).toBe(1);
    vi.advanceTimersByTime(30);
    expect(action).toHaveBeenCalledTimes(1);
    expect(scope.size).toBe(0);
  });

  it('runs no timer after disposal, whether set before or after', () => {
    const scope = new Scope();
    const action = vi.fn();
    scope.timeout(action, 10);
    scope.dispose();
    scope.timeout(action, 10);
    vi.advanceTimersByTime(100);
    expect(action).not.toHaveBeenCalled();
  });

  it('calls a timer off', () => {
    const scope = new Scope();
    const action = vi.fn();
    const callOff = scope.timeout(action, 10);
    callOff();
    vi.advanceTimersByTime(100);
    expect(action).not.toHaveBeenCalled();
  });
});
