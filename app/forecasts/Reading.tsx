'use client';
import { listDeck } from '../../lib/advisory';
import { Button } from '../ui/Button';
import { Notice } from '../ui/Notice';
import ui from '../ui/ui.module.css';
import { words } from '../words';
import { DeckChoices } from './DeckChoices';
import { Placed } from './Placed';
import { PointsTable } from './PointsTable';
import type { ReadingControl } from './useReading';

const text = words.forecasts;

/** What came of the forecast that was given: what was read, or what is wrong and where. */
export function Reading({ reading, byHand, mayIssue }: { reading: ReadingControl; byHand: boolean; mayIssue: boolean }) {
  const { state } = reading;
  if (state.kind === 'none') return null;
  if (state.kind === 'reading') return <p role="status">{text.reading}</p>;
  if (state.kind === 'issued') return <Notice tone="plain" title={text.issued(state.number)} />;
  if (state.kind === 'wrong') {
    return (
      <Notice tone="error" title={text.cannotRead}>
        <p>{state.message}</p>
        <p className="dim">{text.nothingStored}</p>
        {!byHand && <Placed items={state.errors} source={state.source.text} label={text.errors} />}
        <Button onPress={reading.discard}>{text.discard}</Button>
      </Notice>
    );
  }
  const { result, source } = state;
  const deck = result.format === 'deck' && source.text !== null ? listDeck(source.text) : [];
  return (
    <section className={ui.stack} aria-label={text.readAs(text.formats[result.format])} data-testid="reading">
      <h2>
        {result.advisory.storm.name}, {words.header.advisory(result.advisory.number)}
      </h2>
      <p className="dim">
        {text.readAs(text.formats[result.format])}, {result.advisory.centre}
      </p>
      {deck.length > 1 && <DeckChoices deck={deck} choice={state.choice} onChoose={(choice) => reading.read(source, choice)} />}
      {result.warnings.length > 0 ? (
        <Notice tone="warning" title={text.warnings}>
          <Placed items={result.warnings} source={byHand ? null : source.text} label={text.warnings} />
        </Notice>
      ) : (
        <p className="dim">{text.noWarnings}</p>
      )}
      <PointsTable advisory={result.advisory} />
      {state.trouble && <Notice tone="error" title={state.trouble} />}
      <div className={ui.dropActions}>
        {mayIssue && (
          <Button strong isDisabled={state.issuing} onPress={reading.issue}>
            {state.issuing ? text.issuing : text.issue(result.advisory.number)}
          </Button>
        )}
        <Button onPress={reading.discard}>{text.discard}</Button>
      </div>
    </section>
  );
}
