import { EventEmitter } from 'node:events';
import type { Bus } from './services';

/**
 * Hands what happens to whoever listens, in order, in this process. A listener that fails is reported and keeps nobody else from
 * hearing: what happened has happened, and whoever tells of it must not fail for it.
 */
export function makeBus(report: (error: unknown) => void = console.error): Bus {
  const emitter = new EventEmitter();
  emitter.setMaxListeners(0);
  return {
    emit: (name, payload) => void emitter.emit(name, payload),
    on(name, listener) {
      const heard = (payload: Parameters<typeof listener>[0]): void => {
        try {
          listener(payload);
        } catch (error) {
          report(error);
        }
      };
      emitter.on(name, heard);
      return () => void emitter.off(name, heard);
    },
  };
}
