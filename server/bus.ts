import { EventEmitter } from 'node:events';
import type { Bus } from './services';

/** Hands what happens to whoever listens, in order, in this process. */
export function makeBus(): Bus {
  const emitter = new EventEmitter();
  emitter.setMaxListeners(0);
  return {
    emit: (name, payload) => void emitter.emit(name, payload),
    on: (name, listener) => {
      emitter.on(name, listener);
      return () => void emitter.off(name, listener);
    },
  };
}
