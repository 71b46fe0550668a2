import { sendMouse } from '@web/test-runner-commands';

/** A real mouse, in window coordinates, so that pointer capture and cancelling are the browser's own. */
export const mouse = {
  move: (x: number, y: number): Promise<void> =>
    sendMouse({ type: 'move', position: [Math.round(x), Math.round(y)] }),
  down: (): Promise<void> => sendMouse({ type: 'down' }),
  up: (): Promise<void> => sendMouse({ type: 'up' }),
};
