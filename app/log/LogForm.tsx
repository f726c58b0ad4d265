'use client';
import { useState } from 'react';
import type { ZoneRow } from '../../lib/impact';
import { Button } from '../ui/Button';
import { Choice } from '../ui/Choice';
import { Field } from '../ui/Field';
import { Pick } from '../ui/Pick';
import ui from '../ui/ui.module.css';
import { words } from '../words';
import type { NewEntry } from './useLog';

const text = words.log;
const KINDS = ['decision', 'handover', 'note'] as const;
const NO_ZONE = 'none';

/** One entry. What was typed stays until the server has it. */
export function LogForm({ zones, onAdd }: { zones: readonly ZoneRow[]; onAdd: (entry: NewEntry) => Promise<void> }) {
  const [kind, setKind] = useState<NewEntry['kind']>('decision');
  const [typed, setTyped] = useState('');
  const [zone, setZone] = useState<string>(NO_ZONE);
  const [busy, setBusy] = useState(false);
  const [trouble, setTrouble] = useState<string | undefined>(undefined);
  const send = async (): Promise<void> => {
    setBusy(true);
    setTrouble(undefined);
    try {
      await onAdd({ kind, text: typed.trim(), ...(zone === NO_ZONE ? {} : { zoneId: zone }) });
      setTyped('');
      setZone(NO_ZONE);
    } catch (error) {
      setTrouble(error instanceof Error ? error.message : words.common.unreachable);
    } finally {
      setBusy(false);
    }
  };
  return (
    <form
      className={ui.stack}
      aria-label={text.add}
      onSubmit={(event) => {
        event.preventDefault();
        if (typed.trim() !== '' && !busy) void send();
      }}
    >
      <Choice label={text.kind} value={kind} onChange={setKind} options={KINDS.map((value) => ({ value, text: text.kinds[value] }))} />
      <Field label={text.text} value={typed} onChange={setTyped} lines={3} error={trouble} name="logText" />
      <div className={ui.row}>
        <Pick label={text.zone} value={zone} onChange={setZone} options={[{ value: NO_ZONE, text: text.noZone }, ...zones.map((row) => ({ value: row.id, text: row.name }))]} />
        <Button type="submit" strong isDisabled={busy || typed.trim() === ''}>
          {text.send}
        </Button>
      </div>
    </form>
  );
}
