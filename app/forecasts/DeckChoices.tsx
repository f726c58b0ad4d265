'use client';
import type { DeckEntry } from '../../lib/advisory';
import { words } from '../words';
import { Pick } from '../ui/Pick';
import type { DeckChoice } from './calls';
import ui from '../ui/ui.module.css';

const ANY = 'any';

/** A deck holds many forecasts: which technique, from which cycle. */
export function DeckChoices({ deck, choice, onChoose }: { deck: readonly DeckEntry[]; choice: DeckChoice; onChoose: (choice: DeckChoice) => void }) {
  const usable = deck.filter((entry) => entry.usableLeads > 0);
  const techniques = [...new Set(usable.map((entry) => entry.technique))].sort();
  const cycles = [...new Set(usable.filter((entry) => choice.technique === undefined || entry.technique === choice.technique).map((entry) => entry.cycle))].sort().reverse();
  const options = (values: string[]) => [{ value: ANY, text: words.forecasts.firstFound }, ...values.map((value) => ({ value, text: value }))];
  const given = (value: string): string | undefined => (value === ANY ? undefined : value);
  return (
    <div className={ui.dropActions}>
      <Pick label={words.forecasts.technique} value={choice.technique ?? ANY} options={options(techniques)} onChange={(value) => onChoose({ technique: given(value) })} />
      <Pick label={words.forecasts.cycle} value={choice.cycle ?? ANY} options={options(cycles)} onChange={(value) => onChoose({ ...choice, cycle: given(value) })} />
    </div>
  );
}
