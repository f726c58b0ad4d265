import { useCallback, useRef, useState } from 'react';
import type { InputError } from '../../lib/advisory';
import { MOST_ADVISORY_BYTES } from '../../lib/wire';
import { RequestFailed } from '../http/problem';
import { words } from '../words';
import { issueForecast, readForecast } from './calls';
import type { DeckChoice, DryRun } from './calls';
import { megabytes } from './source';
import type { Source } from './source';

export type ReadingState =
  | { kind: 'none' }
  | { kind: 'reading'; source: Source; choice: DeckChoice }
  | { kind: 'read'; source: Source; choice: DeckChoice; result: DryRun; issuing: boolean; trouble: string | null }
  | { kind: 'wrong'; source: Source; choice: DeckChoice; message: string; errors: readonly InputError[] }
  | { kind: 'issued'; number: string };

export interface ReadingControl {
  state: ReadingState;
  read(source: Source, choice?: DeckChoice): void;
  issue(): void;
  discard(): void;
}

const asWrong = (error: unknown): { message: string; errors: readonly InputError[] } =>
  error instanceof RequestFailed ? { message: error.message, errors: error.errors } : { message: error instanceof Error ? error.message : words.common.unreachable, errors: [] };

/** A forecast on its way from a file to an issued advisory: read and checked by the server first, stored only when issued. */
export function useReading(eventId: string): ReadingControl {
  const [state, setState] = useState<ReadingState>({ kind: 'none' });
  const turn = useRef(0);
  const key = useRef('');

  const read = useCallback(
    (source: Source, choice: DeckChoice = {}): void => {
      const mine = ++turn.current;
      const bytes = typeof source.body === 'string' ? new Blob([source.body]).size : source.body.size;
      const refuse = (message: string): void => setState({ kind: 'wrong', source, choice, message, errors: [] });
      if (bytes === 0) return refuse(words.forecasts.empty);
      if (bytes > MOST_ADVISORY_BYTES) return refuse(words.forecasts.tooBig(megabytes(bytes), megabytes(MOST_ADVISORY_BYTES)));
      setState({ kind: 'reading', source, choice });
      readForecast(eventId, source, choice).then(
        (result) => {
          if (mine !== turn.current) return;
          key.current = crypto.randomUUID();
          setState({ kind: 'read', source, choice, result, issuing: false, trouble: null });
        },
        (error: unknown) => mine === turn.current && setState({ kind: 'wrong', source, choice, ...asWrong(error) }),
      );
    },
    [eventId],
  );

  const issue = useCallback((): void => {
    if (state.kind !== 'read' || state.issuing) return;
    setState({ ...state, issuing: true, trouble: null });
    issueForecast(eventId, state.source, state.choice, key.current).then(
      (issued) => setState({ kind: 'issued', number: issued.advisory.number }),
      (error: unknown) => setState({ ...state, issuing: false, trouble: asWrong(error).message }),
    );
  }, [eventId, state]);

  const discard = useCallback((): void => {
    turn.current += 1;
    setState({ kind: 'none' });
  }, []);
  return { state, read, issue, discard };
}
