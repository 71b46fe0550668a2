import { aTimeout, expect, waitUntil } from '@open-wc/testing';
import { emulateMedia } from '@web/test-runner-commands';
import type { ReactiveController, ReactiveControllerHost } from 'lit';
import { ThemeWatcher } from '../../../components/chart/theme-watcher.ts';
import { setTheme } from '../both-themes.ts';

class Host implements ReactiveControllerHost {
  readonly updateComplete = Promise.resolve(true);
  readonly controllers: ReactiveController[] = [];
  addController(controller: ReactiveController): void {
    this.controllers.push(controller);
  }
  removeController(): void {}
  requestUpdate(): void {}
}

describe('watching the theme', () => {
  let host: Host;
  let calls: number;

  beforeEach(() => {
    host = new Host();
    calls = 0;
    new ThemeWatcher(host, () => {
      calls += 1;
    });
  });

  afterEach(async () => {
    host.controllers[0]!.hostDisconnected?.();
    setTheme(undefined);
    await emulateMedia({ colorScheme: 'light' });
  });

  it('tells of the switch on the page', async () => {
    host.controllers[0]!.hostConnected?.();
    setTheme('dark');
    await aTimeout(0); // mutation observers call back after the task
    expect(calls).to.equal(1);
  });

  it('tells of the system', async () => {
    await emulateMedia({ colorScheme: 'light' });
    host.controllers[0]!.hostConnected?.();
    await emulateMedia({ colorScheme: 'dark' });
    // The browser tells of it with its next frame, whenever that comes on a busy machine.
    await waitUntil(() => calls > 0, 'the change of the system', { timeout: 10_000 });
  });

  it('is silent before it is connected and after it is not', async () => {
    setTheme('dark');
    await aTimeout(0);
    host.controllers[0]!.hostConnected?.();
    host.controllers[0]!.hostDisconnected?.();
    setTheme('light');
    await aTimeout(0);
    expect(calls).to.equal(0);
  });
});
